"""What the screens show: from readings, through the core, to words and numbers.

One module a step. They import the core and so numpy, and no Flet; screens import them once the
calculator is there (`mobileapp.browser.late_ready`).
"""
