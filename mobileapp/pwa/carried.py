"""Which Python modules come along into the browser, and which stay at home.

What stays is whole modules and whole sub-packages, never some files out of one that is used.
An import of one of them in the browser is a plain ModuleNotFoundError. That nothing carried
needs them is shown by the tests, which import every carried module in the browser's own Python.
"""

# Standard library: tools of developers, servers and clients of protocols that a page can't speak,
# processes and terminals, archives, pure-Python twins of compiled modules, other platforms.
_STDLIB_AT_HOME = """
    _pyrepl antigravity bdb cProfile cmd code compileall doctest modulefinder pdb pickletools
    profile pstats py_compile pyclbr pydoc rlcompleter symtable tabnanny this timeit trace
    tracemalloc unittest zipapp __hello__ __phello__ asyncio.__main__ asyncio.tools
    json.__main__ json.tool pyodide.console

    _ssl ftplib html http imaplib mailbox netrc poplib smtplib socketserver ssl webbrowser wsgiref
    xmlrpc email importlib.metadata mimetypes quopri _markupbase
    urllib.error urllib.request urllib.response urllib.robotparser
    logging.config logging.handlers pyodide._nodesock_transport

    concurrent.futures.interpreter concurrent.futures.process concurrent.interpreters ctypes curses
    dbm getpass multiprocessing pty readline shelve shlex sqlite3 tty
    argparse configparser fileinput filecmp getopt gettext optparse sched tarfile

    _pyio _pydatetime _pydecimal _py_abc asyncio.proactor_events asyncio.windows_events
    asyncio.windows_utils
    colorsys difflib graphlib nturl2path plistlib stringprep tomllib sysconfig
    _sysconfigdata__emscripten_wasm32-emscripten wave zoneinfo xml.dom xml.sax
""".split()  # noqa: SIM905  # a paragraph reads better than a line a name

# Standard library that is inside the interpreter itself; its copies as files are never read
# (`_imp._frozen_module_names()` lists them).
_FROZEN = """
    _collections_abc.py _sitebuiltins.py abc.py codecs.py genericpath.py importlib/_bootstrap.py
    importlib/_bootstrap_external.py importlib/machinery.py importlib/util.py io.py ntpath.py os.py
    posixpath.py runpy.py site.py stat.py zipimport.py
""".split()  # noqa: SIM905  # likewise

# Every text the app reads or writes is Unicode; these are all of `encodings` that isn't a national
# character set.
_ENCODINGS = """
    __init__ aliases ascii base64_codec charmap cp437 hex_codec latin_1 raw_unicode_escape
    unicode_escape utf_16 utf_16_be utf_16_le utf_32 utf_32_be utf_32_le utf_8 utf_8_sig
""".split()  # noqa: SIM905  # a paragraph reads better than a line a name

# Packages: tests, servers, command lines, log-in services, headers for compilers.
_PACKAGES_AT_HOME = """
    flet.auth flet.cli flet.fastapi flet.messaging.flet_dart_bridge_server
    flet.messaging.flet_socket_server flet.pytest_plugin flet.security flet.testing
    flet.utils.griffe_deprecations flet_charts.matplotlib_backends msgpack.fallback
    numpy._configtool numpy._core._multiarray_tests numpy._core._operand_flag_tests
    numpy._core._rational_tests numpy._core._simd numpy._core._struct_ufunc_tests
    numpy._core._umath_tests numpy._core.cversions numpy._core.include numpy._core.lib
    numpy._core.tests numpy._pyinstaller numpy._typing.tests numpy.conftest numpy.core
    numpy.ctypeslib numpy.distutils numpy.doc numpy.f2py numpy.fft numpy.lib.recfunctions
    numpy.lib.tests numpy.linalg.lapack_lite numpy.linalg.tests numpy.ma.mrecords numpy.ma.tests
    numpy.ma.testutils numpy.ma.timer_comparison numpy.matlib numpy.matrixlib.tests
    numpy.polynomial numpy.random numpy.testing numpy.tests numpy.typing.mypy_plugin
    numpy.typing.tests
""".split()  # noqa: SIM905  # a paragraph reads better than a line a name

# Modules that only attach documentation, by calls, so that -OO doesn't drop it.
_ONLY_DOCUMENTATION = ("numpy/_core/_add_newdocs.py", "numpy/_core/_add_newdocs_scalars.py")

# What Python or a package reads beside its modules.
_DATA = ("flet/controls/material/icons.json",)


def module_name(path: str) -> str:
    """Give the dotted name of a file of code: `flet/app.py` and `flet/__init__.py` alike."""
    stem = path.partition(".")[0]
    return stem.removesuffix("/__init__").replace("/", ".")


def stdlib_module_is_carried(path: str) -> bool:
    """Tell whether a file of the standard library comes along."""
    if path.startswith("encodings/"):
        return path.removesuffix(".py").partition("/")[2] in _ENCODINGS
    if path in _FROZEN or not path.endswith(".py"):
        return False
    return not _within(module_name(path), _STDLIB_AT_HOME)


def package_file_is_carried(path: str) -> bool:
    """Tell whether a file of a wheel comes along: code that isn't left at home, or its data."""
    if path in _DATA:
        return True
    return path.endswith((".py", ".so")) and not _within(module_name(path), _PACKAGES_AT_HOME)


def without_documentation(path: str, content: bytes) -> bytes:
    """Give the file's content, or an empty module if it only documents others."""
    return b"" if path in _ONLY_DOCUMENTATION else content


def _within(module: str, families: list[str]) -> bool:
    return any(module == name or module.startswith(f"{name}.") for name in families)
