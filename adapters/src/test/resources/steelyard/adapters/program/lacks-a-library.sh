echo "error while loading shared libraries: libzz.so.1: cannot open shared object file" >&2
exit 127
