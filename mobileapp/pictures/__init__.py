"""Drawings of our own, in the app's colours, for people who would rather look than read."""
