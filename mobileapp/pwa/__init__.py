"""Turn the app into a folder of static files, and serve that folder.

Nothing here runs in the browser. In the order of the build:

    inputs    the pinned wheels, downloaded once and checked
    sources   our own Python files, and a fingerprint of all that a build depends on
    bytecode  .py to .pyc, by the browser's own Python
    carried   which modules come along, and which are left at home
    pack      many files in one, unpacked by the Python worker
    client    Flet's web client, without the parts the app never asks for
    fonts     icon font cut down to the icons used; our own fonts
    icons     the app's icons from one drawing; manifest
    notices   licences of everything carried, on one page
    release   the one list of files, and the id that names them
    compress  .br and .gz beside each file
    build     all of the above, moved into place in one step
    server    the local server
    command   the command line
"""
