"""The building blocks of the screens."""
