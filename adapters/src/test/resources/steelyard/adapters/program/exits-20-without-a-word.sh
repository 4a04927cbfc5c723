exit 20
