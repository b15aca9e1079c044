"""The headers that make the app private and its updates safe, for any host.

The page carries the policy too; a worker only obeys the headers of its own script, so every
response gets them.
"""

# Our own origin, WebAssembly and our workers; nothing else, from nowhere else. Flutter styles its
# canvas host with inline style sheets, and draws pictures from memory.
CONTENT_SECURITY_POLICY = (
    "default-src 'none'; "
    "script-src 'self' 'wasm-unsafe-eval'; "
    "worker-src 'self'; "
    "connect-src 'self'; "
    "img-src 'self' blob: data:; "
    "font-src 'self'; "
    "style-src 'self' 'unsafe-inline'; "
    "manifest-src 'self'; "
    "base-uri 'self'; "
    "form-action 'none'"
)

SECURITY = {
    "Content-Security-Policy": CONTENT_SECURITY_POLICY,
    "Referrer-Policy": "no-referrer",
    "X-Content-Type-Options": "nosniff",
}

# A release never changes under its address; everything else is asked for anew.
FOREVER = "public, max-age=31536000, immutable"
ASK_AGAIN = "no-cache"


def cache_control(path: str) -> str:
    """Give the Cache-Control value for a path below the site's root."""
    return FOREVER if path.startswith("r/") else ASK_AGAIN
