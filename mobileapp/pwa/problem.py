"""The one kind of failure that the command line reports."""


class BuildProblem(Exception):  # noqa: N818  # read as "a problem", shown as one sentence
    """Something that went wrong for a reason the reader can act on; `str()` is the sentence."""
