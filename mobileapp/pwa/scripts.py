"""Small repairs to scripts that we carry."""


def without_source_map(script: bytes) -> bytes:
    """Drop the pointer to a source map that isn't carried, which developer tools would ask for."""
    return b"\n".join(
        line for line in script.split(b"\n") if not line.startswith(b"//# sourceMappingURL=")
    )
