"""Mechanics of sag, springs, frequency and rebound for suspension set-up."""
