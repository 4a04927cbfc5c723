# Leaves a child behind that holds the output open, and says its number.
sleep 1000 &
echo $! > child.pid
echo "s UNSATISFIABLE"
wait
