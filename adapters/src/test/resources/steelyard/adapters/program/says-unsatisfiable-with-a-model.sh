echo "s UNSATISFIABLE"
echo "v 1 0"
exit 20
