head -c 200000 /dev/zero | tr '\0' '\377'
printf '\nv\nv 3 x\n\n\ns\n'
