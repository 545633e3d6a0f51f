"""``python -m xlbridge.cli`` is the ``storyledger`` command."""

from xlbridge.cli import main

main()
