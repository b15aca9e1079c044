"""The command line: build the app, serve it, or both."""

import argparse
import errno
import sys
from collections.abc import Sequence
from pathlib import Path

from mobileapp.pwa.build import build, check_complete, is_current
from mobileapp.pwa.paths import DEFAULT_SITE
from mobileapp.pwa.problem import BuildProblem
from mobileapp.pwa.progress import say
from mobileapp.pwa.server import make_server

PORT = 8765
HOST = "127.0.0.1"


def main(arguments: Sequence[str] | None = None) -> int:
    """Run one command; a failure is one sentence on the error output, and a code above zero."""
    options = _parser().parse_args(arguments)
    try:
        if options.command == "build":
            build(options.out)
        elif options.command == "serve":
            serve(options.site, options.host, options.port)
        else:
            build_if_needed(options.site)
            serve(options.site, options.host, options.port)
    except BuildProblem as problem:
        sys.stderr.write(f"{problem}\n")
        return 1
    except OSError as error:
        sys.stderr.write(f"{_sentence(error)}\n")
        return 1
    except KeyboardInterrupt:
        sys.stderr.write("Stopped.\n")
        return 130
    return 0


def build_if_needed(site: Path) -> None:
    """Build unless `site` was built from exactly what is here now."""
    if is_current(site):
        say(f"{site} is up to date.")
    else:
        build(site)


def serve(site: Path, host: str, port: int) -> None:
    """Serve a built folder until interrupted.

    Raises:
        BuildProblem: there is no whole build, or the port can't be opened.
    """
    check_complete(site)
    with make_server(site, host, port) as server:
        say(
            f"\nOpen http://localhost:{server.server_port}/ in a browser on this machine."
            "\nA phone needs the built folder on an HTTPS host, or this port forwarded over USB: "
            "\nbrowsers keep an app for offline use only from https:// or localhost."
            "\nStop with Ctrl+C."
        )
        server.serve_forever()


def _parser() -> argparse.ArgumentParser:
    parser = argparse.ArgumentParser(
        prog="python -m mobileapp",
        description="Sag & Bounce: without a command, build the app if needed and serve it.",
    )
    commands = parser.add_subparsers(dest="command", metavar="{build,serve}")
    only_build = commands.add_parser("build", help="only build the static folder")
    only_build.add_argument("--out", type=_folder, default=DEFAULT_SITE, help="the folder to make")
    only_serve = commands.add_parser("serve", help="only serve a built folder")
    for serving in (parser, only_serve):
        serving.add_argument("--port", type=_port, default=PORT, help=f"default {PORT}")
        serving.add_argument("--host", default=HOST, help=f"address to listen on, default {HOST}")
        serving.add_argument(
            "--site", type=_folder, default=DEFAULT_SITE, help="the built folder to serve"
        )
    return parser


def _folder(text: str) -> Path:
    return Path(text).resolve()


def _port(text: str) -> int:
    highest = 65535
    if not text.isdigit() or int(text) > highest:
        raise argparse.ArgumentTypeError(f"{text!r} is not a port; ports go from 0 to {highest}")
    return int(text)


def _sentence(error: OSError) -> str:
    where = f" ({error.filename})" if error.filename else ""
    if error.errno in {errno.ENOSPC, errno.EDQUOT}:
        return f"The disk is full{where}; the earlier build, if any, is untouched."
    return f"{error.strerror or error}{where}; the earlier build, if any, is untouched."
