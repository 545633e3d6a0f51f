"""These tests need xlwings' Windows branch, so they run in a process of their own (../test_genuine.py)."""

import os

if os.environ.get("STORYLEDGER_WINDOWS_BRANCH"):
    from tests.support import windows_stubs

    windows_stubs.install()
else:
    collect_ignore_glob = ["*"]
