while true; do head -c 1000000 /dev/zero; done
