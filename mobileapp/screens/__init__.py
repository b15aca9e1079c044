"""One screen a file. A screen shows and asks; it calculates nothing."""
