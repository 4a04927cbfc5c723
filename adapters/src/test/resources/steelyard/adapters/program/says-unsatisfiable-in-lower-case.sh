echo "s unsatisfiable"
exit 20
