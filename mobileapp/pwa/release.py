"""The one list of everything in the built folder, and the name of the release it makes up.

    index.html  sw.js  manifest.webmanifest  icons/  screenshots/  release.json
    r/<release>/    all the rest, which never changes under its address
        boot.js …   the page's own files, from mobileapp/pwa/page/
        client/     Flet's web client
        python/     the Python runtime
        app.pack    Python modules of the first paint     (see pack.py)
        late.pack   numpy and charts, loaded after it
        notices/    licences

The release's id is a hash over the paths and contents of all of it, so it changes exactly when
something does. The page's files may hold these placeholders:

    {{release}}     the id
    {{version}}     the version of the project
    {{policy}}      the Content-Security-Policy
    {{files}}       JSON list of what the service worker keeps, each
                    {"path", "bytes", "integrity": "sha256-…", "engine": "chromium"|"other"|null};
                    a browser takes what is for its own engine or for none in particular

`release.json` lists every served file with bytes and SHA-256, except itself and `sw.js`, which
holds the list: {"release", "version", "sources", "files": [{"path", "bytes", "sha256"}, …]}.
"sources" is a fingerprint of what it was built from, by which a build knows that it is current.
"""

import json
from base64 import b64encode
from collections.abc import Mapping
from hashlib import sha256

from mobileapp.pwa.client import ENGINES
from mobileapp.pwa.policy import CONTENT_SECURITY_POLICY

WORKER = "sw.js"
LIST = "release.json"

# Seen only by an app store's or a browser's install dialogue, which is online.
_NOT_KEPT = ("screenshots/",)

_ID_DIGITS = 16

# Files of the page in which placeholders are filled in.
_TEXT = (".html", ".js", ".mjs", ".css", ".webmanifest", ".json", ".py", ".svg")


def assemble(
    root: Mapping[str, bytes], inside: Mapping[str, bytes], version: str, sources: str
) -> dict[str, bytes]:
    """Give the whole built folder, contents by path.

    Args:
        root: files at fixed addresses, by path; among them index.html and sw.js.
        inside: files of this release only, by path below r/<release>/.
        version: the project's version.
        sources: fingerprint of the sources.
    """
    release = _release_id({**root, **{f"r/{path}": content for path, content in inside.items()}})
    values = {
        "{{release}}": release,
        "{{version}}": version,
        "{{policy}}": CONTENT_SECURITY_POLICY,
    }
    site = {path: _fill(path, content, values) for path, content in root.items()}
    site |= {f"r/{release}/{path}": _fill(path, raw, values) for path, raw in inside.items()}
    worker = site.pop(WORKER)
    listed = sorted(site)
    files = [entry for path in listed if (entry := _kept(path, site[path], release))]
    site[WORKER] = worker.replace(b"{{files}}", json.dumps(files, indent=0).encode())
    site[LIST] = json.dumps(
        {
            "release": release,
            "version": version,
            "sources": sources,
            "files": [
                {
                    "path": path,
                    "bytes": len(site[path]),
                    "sha256": sha256(site[path]).hexdigest(),
                }
                for path in listed
            ],
        },
        indent=1,
    ).encode()
    return site


def _release_id(files: Mapping[str, bytes]) -> str:
    digest = sha256()
    for path in sorted(files):
        digest.update(f"{path}\0".encode())
        digest.update(sha256(files[path]).digest())
    return digest.hexdigest()[:_ID_DIGITS]


def _fill(path: str, content: bytes, values: Mapping[str, str]) -> bytes:
    if path.endswith(_TEXT) and not path.startswith(("client/", "python/")):
        for placeholder, value in values.items():
            content = content.replace(placeholder.encode(), value.encode())
    return content


def _kept(path: str, content: bytes, release: str) -> dict[str, str | int | None] | None:
    """Give the service worker's entry for a file, or None for a file it doesn't keep."""
    if path.startswith(_NOT_KEPT):
        return None
    client = f"r/{release}/client/"
    engine = next((e for folder, e in ENGINES.items() if path.startswith(client + folder)), None)
    return {
        "path": path,
        "bytes": len(content),
        "integrity": f"sha256-{b64encode(sha256(content).digest()).decode()}",
        "engine": engine,
    }
