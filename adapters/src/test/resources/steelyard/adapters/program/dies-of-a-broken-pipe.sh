echo "s SATISFIABLE"
echo "v 1"
kill -PIPE $$
