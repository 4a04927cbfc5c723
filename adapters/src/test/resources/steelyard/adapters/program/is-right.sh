# Has a pipe broken on the way, as shells of the usual kind do without a word.
yes | head -n 1 > /dev/null
echo "c a banner"
echo "WARNING: a line of no kind"
echo "s SATISFIABLE"
echo "v 1"
echo "v 0"
echo "c conflicts: 3 0.1 per second"
echo "c 5 decisions"
exit 10
