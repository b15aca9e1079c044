"""Compile every .py below /stage/in to /stage/out. Runs inside the browser's Python only.

The source hash in a .pyc is what its header asks for; "unchecked" means that nobody looks for the
source again, which isn't carried.
"""

from importlib import _bootstrap_external
from importlib.util import source_hash
from pathlib import Path

IN, OUT = Path("/stage/in"), Path("/stage/out")

for path in sorted(IN.rglob("*.py")):
    module = path.relative_to(IN)
    source = path.read_bytes()
    # The name that tracebacks show.
    code = compile(source, str(module), "exec", dont_inherit=True, optimize=2)
    target = OUT / module.with_suffix(".pyc")
    target.parent.mkdir(parents=True, exist_ok=True)
    target.write_bytes(
        _bootstrap_external._code_to_hash_pyc(code, source_hash(source), checked=False)  # noqa: SLF001  # what py_compile calls
    )
