echo "s SATISFIABLE"
echo "v 1 0 2"
exit 10
