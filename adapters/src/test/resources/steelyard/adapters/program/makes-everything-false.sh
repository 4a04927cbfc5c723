# Prints the assignment in which no variable is true.
variables=$(sed -n 's/^p cnf \([0-9]*\) .*/\1/p' "$1")
echo "s SATISFIABLE"
for v in $(seq 1 "$variables"); do echo "v -$v"; done
echo "v 0"
exit 10
