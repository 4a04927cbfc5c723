echo "satlib.cnf:4: expected number: s UNSATISFIABLE"
exit 20
