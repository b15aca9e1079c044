"""The promises of the repository itself: its top level, and two commands that stay true."""

import re
import subprocess
from pathlib import Path

ROOT = Path(__file__).parent.parent
TOP_LEVEL = {
    "README.md",
    "DEVELOPERS.md",
    "pyproject.toml",
    "mobileapp",
    "core",
    "tests",
    "assets",
}


def tracked_files():
    listing = subprocess.run(
        ["git", "ls-files"], cwd=ROOT, check=True, capture_output=True, text=True
    )
    return listing.stdout.splitlines()


def readme_commands():
    """The lines of the README's shell blocks."""
    blocks = re.findall(r"```sh\n(.*?)```", (ROOT / "README.md").read_text("utf-8"), re.DOTALL)
    return [line for block in blocks for line in block.splitlines() if line]


def test_top_level_holds_exactly_what_was_agreed():
    names = {path.split("/")[0] for path in tracked_files()}
    assert {name for name in names if not name.startswith(".")} == TOP_LEVEL


def test_the_automatic_check_runs_exactly_the_readmes_test_command():
    script = (ROOT / ".ci" / "run").read_text("utf-8")
    (command,) = [line for line in readme_commands() if "-m tests" in line]
    assert script.splitlines()[-1] == command


def test_readme_has_a_command_that_builds_and_serves():
    (command,) = [line for line in readme_commands() if line.endswith("-m mobileapp")]
    assert command.startswith("python3 -m venv .venv && ")
