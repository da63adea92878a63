"""Questions that a takeoff sheet asks of a code edition, one a cell: `python python-examples/takeoff_cells.py`."""

import dwv

code = dwv.edition("npc-2015")

print(f"{code.title}\n")
for trap in ("1-1/4", "1-1/2", "2", "3", "4"):
    print(f"largest trap {trap:>5} in: least vent {code.vent_for_trap(trap):>5} in")

load = 2 * code.load_of_fixture("lavatory", "1-1/2") + code.load_of_fixture("kitchen-sink")
print(f"\ntwo lavatories and a kitchen sink: {load:g} FU")
print(f"  on a branch:         {code.drain_for_load('branch', load)} in")
print(f"  on a building drain: {code.drain_for_load('building-drain', load, '1:50')} in at 1:50")

print(f"\na run of 3.8 m at 1:50 falls {dwv.fall('3.8 m', '1:50')}")
print(f"a run of 12 ft 6 in at 1/4 in per ft falls {dwv.fall('12 ft 6 in', '1/4 in per ft')}")
print(f"a trap arm of 1-1/2 in is no longer than {code.longest_trap_arm('1-1/2')}")

print("\nAnswers support, and do not replace, the local code in force, the authority and a licensed practitioner.")
