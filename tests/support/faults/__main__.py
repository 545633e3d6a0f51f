"""Print the catalogue."""

from tests.support.faults.all import FAULTS
from tests.support.faults.catalogue import GROUPS

for group in GROUPS:
    print(f"\n{group}")
    for fault in (fault for fault in FAULTS if fault.group == group):
        print(f"  {fault.name}: {fault.words} [{', '.join(sorted(fault.kinds)) or fault.missed}]")
