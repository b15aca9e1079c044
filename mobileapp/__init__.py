"""The Sag & Bounce app: screens, store, and the assembly of its web build."""
