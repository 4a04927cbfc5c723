echo "s SATISFIABLE"
echo "v 1 -1 0"
exit 10
