"""Studies and benches that a person runs: ``python -m tests.bench.<name>``."""
