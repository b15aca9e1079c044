"""`python -m mobileapp`: build the app if needed, and serve it."""

import sys

from mobileapp.pwa.command import main

if __name__ == "__main__":
    sys.exit(main())
