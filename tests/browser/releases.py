"""A second release of the app, made from the first: same program, another id, one changed file."""

import json
import re
import shutil
from base64 import b64encode
from hashlib import sha256

TEXT = {".html", ".js", ".css", ".webmanifest", ".json"}
CHANGED = "style.css"


def next_release(site, folder):
    """Write the release after `site` into `folder`, and return it."""
    old = json.loads((site / "release.json").read_text())["release"]
    new = sha256(old.encode()).hexdigest()[: len(old)]
    shutil.copytree(site, folder, ignore=shutil.ignore_patterns("*.br", "*.gz"))
    (folder / "r" / old).rename(folder / "r" / new)
    for path in folder.rglob("*"):
        if path.suffix in TEXT:
            text = path.read_text("utf-8").replace(old, new)
            path.write_text(text + ("/* next */" if path.name == CHANGED else ""), "utf-8")
    list_anew(folder)
    return folder


def list_anew(folder):
    """Make a changed site's lists true again: sizes and hashes."""
    worker = (folder / "sw.js").read_text("utf-8")
    kept = re.search(r"const FILES = (\[.*?\])\.filter", worker, re.DOTALL)[1]
    files = json.loads(kept)
    for file in files:
        content = (folder / file["path"]).read_bytes()
        digest = b64encode(sha256(content).digest()).decode()
        file |= {"bytes": len(content), "integrity": f"sha256-{digest}"}
    (folder / "sw.js").write_text(worker.replace(kept, json.dumps(files)), "utf-8")
    whole = json.loads((folder / "release.json").read_text("utf-8"))
    for file in whole["files"]:
        content = (folder / file["path"]).read_bytes()
        file |= {"bytes": len(content), "sha256": sha256(content).hexdigest()}
    (folder / "release.json").write_text(json.dumps(whole), "utf-8")


def release_of(phone):
    """Return the id of the release a page runs."""
    source = phone.page.locator("script[type=module]").get_attribute("src")
    return source.split("/")[1]
