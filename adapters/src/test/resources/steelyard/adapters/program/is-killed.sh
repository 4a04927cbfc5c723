echo "s UNSATISFIABLE"
kill -KILL $$
