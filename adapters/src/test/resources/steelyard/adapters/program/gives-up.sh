echo "s UNKNOWN"
