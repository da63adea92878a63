"""Draws a house in Python, sizes it, prints its schedules and writes them to a folder.

    python python-examples/build_house.py [folder]

The folder is `out` when none is named. The house is made up for this example. Results support, and do not replace, the
local code in force, the authority having jurisdiction and a licensed practitioner.
"""

import sys
from pathlib import Path
from typing import get_args

import dwv


def draw() -> dwv.Layout:
    """Two storeys on a basement: three bathrooms, a powder room, a kitchen and a laundry."""
    house = dwv.Layout.builder("Alder, two storeys with basement", "npc-2015", frost_can_close_vents=True)
    house.level("basement", "-2.7 m").level("main", "0 m").level("upper", "2.9 m").level("roof", "5.8 m")
    draw_upper_baths(house)
    draw_soil_stack(house)
    draw_powder_room(house)
    draw_kitchen_and_laundry(house)
    draw_basement_bath(house)
    draw_building_drain(house)
    draw_vents(house)
    return house.build()


def draw_upper_baths(house: dwv.LayoutBuilder) -> None:
    """The ensuite (A) and the family bath (B): in each, the lavatory's drain vents the shower or bathtub."""
    house.fixture("LAV-A", "lavatory", "upper", height="0.45 m", trap="1-1/2", group="ensuite")
    house.fixture("SH-A", "shower", "upper", height="-0.15 m", trap="1-1/2", group="ensuite")
    house.fixture("WC-A", "water-closet", "upper", height="-0.1 m", group="ensuite")
    house.joint("A1", "upper", height="0.42 m")
    house.joint("A2", "upper", height="-0.2 m").joint("A3", "upper", height="-0.22 m")
    house.drain("a1", "LAV-A", "A1", length="0.6 m").drain("a2", "A1", "A2", runs="vertical")
    house.drain("a3", "SH-A", "A2", length="1.2 m").drain("a4", "A2", "A3", length="1.4 m")
    house.drain("a5", "WC-A", "A3", length="0.8 m").drain("a6", "A3", "U", length="0.9 m")

    house.fixture("LAV-B", "lavatory", "upper", height="0.45 m", trap="1-1/2", group="family bath")
    house.fixture("TUB-B", "bathtub", "upper", height="-0.15 m", group="family bath")
    house.fixture("WC-B", "water-closet", "upper", height="-0.1 m", group="family bath")
    house.joint("B1", "upper", height="0.42 m")
    house.joint("B2", "upper", height="-0.2 m").joint("B3", "upper", height="-0.22 m")
    house.drain("b1", "LAV-B", "B1", length="0.75 m").drain("b2", "B1", "B2", runs="vertical")
    house.drain("b3", "TUB-B", "B2", length="1.05 m").drain("b4", "B2", "B3", length="1.8 m")
    house.drain("b5", "WC-B", "B3", length="0.6 m").drain("b6", "B3", "U", length="1.1 m")


def draw_soil_stack(house: dwv.LayoutBuilder) -> None:
    """From the upper baths down to the basement floor; its foot can be cleaned out."""
    house.joint("U", "upper", height="-0.25 m").joint("M", "main", height="-0.3 m")
    house.joint("F", "basement", height="-0.6 m").cleanout("CO1", "F")
    house.drain("ss1", "U", "M", runs="vertical").drain("ss2", "M", "F", runs="vertical")


def draw_powder_room(house: dwv.LayoutBuilder) -> None:
    """A lavatory and a water closet on the main floor."""
    house.fixture("LAV-P", "lavatory", "main", height="0.45 m", trap="1-1/4")
    house.fixture("WC-P", "water-closet", "main", height="-0.1 m")
    house.joint("P1", "main", height="0.42 m").joint("P2", "main", height="-0.25 m")
    house.drain("p1", "LAV-P", "P1", length="0.5 m").drain("p2", "P1", "P2", runs="vertical")
    house.drain("p3", "WC-P", "P2", length="0.9 m").drain("p4", "P2", "M", length="2.2 m")


def draw_kitchen_and_laundry(house: dwv.LayoutBuilder) -> None:
    """Each drops through the basement; they meet under its floor."""
    house.fixture("KS", "kitchen-sink", "main", height="0.45 m", outlet_length="0.35 m")
    house.fixture("LT", "laundry-tray", "main", height="0.45 m")
    house.fixture("CW", "clothes-washer", "main", height="0.3 m")
    house.joint("K1", "main", height="0.42 m").joint("K2", "basement", height="-0.45 m")
    house.joint("L1", "main", height="0.28 m").joint("L2", "basement", height="-0.5 m")
    house.drain("k1", "KS", "K1", length="0.9 m").drain("k2", "K1", "K2", runs="vertical")
    house.drain("l1", "LT", "L1", length="0.7 m").drain("l2", "CW", "L1", length="0.8 m")
    house.drain("l3", "L1", "L2", runs="vertical")
    house.drain("k3", "K2", "L2", length="3.4 m", underground=True)
    house.drain("kl", "L2", "F", length="4.1 m", underground=True)


def draw_basement_bath(house: dwv.LayoutBuilder) -> None:
    """A bathroom on the basement floor, its drains under it."""
    house.fixture("LAV-C", "lavatory", "basement", height="0.45 m", trap="1-1/2", group="basement bath")
    house.fixture("SH-C", "shower", "basement", height="-0.25 m", trap="2", group="basement bath")
    house.fixture("WC-C", "water-closet", "basement", height="-0.35 m", group="basement bath")
    house.joint("C1", "basement", height="0.42 m")
    house.joint("C2", "basement", height="-0.5 m").joint("C3", "basement", height="-0.55 m")
    house.drain("c1", "LAV-C", "C1", length="0.6 m").drain("c2", "C1", "C2", runs="vertical")
    house.drain("c3", "SH-C", "C2", length="1.5 m", underground=True)
    house.drain("c4", "C2", "C3", length="1.2 m", underground=True)
    house.drain("c5", "WC-C", "C3", length="0.9 m", underground=True)
    house.drain("c6", "C3", "G", length="2 m", underground=True)


def draw_building_drain(house: dwv.LayoutBuilder) -> None:
    """From the foot of the soil stack, past the floor drain, through the wall and to the public sewer."""
    house.fixture("FD", "floor-drain", "basement", height="-0.4 m", trap="3")
    house.joint("G", "basement", height="-0.65 m").joint("H", "basement", height="-0.7 m")
    house.joint("W", "basement", height="-0.8 m").cleanout("CO2", "W").joint("S", "basement", height="-1.1 m")
    house.drain("fd1", "FD", "H", length="1.8 m", underground=True)
    house.drain("bd1", "F", "G", length="3.2 m", underground=True)
    house.drain("bd2", "G", "H", length="1.6 m", underground=True)
    house.drain("bd3", "H", "W", length="2.4 m", underground=True)
    house.drain("bs1", "W", "S", length="9.5 m", underground=True, outside=True)
    house.sewer("S", invert="-4.1 m")


def draw_vents(house: dwv.LayoutBuilder) -> None:
    """All vents meet under the roof and pass it once."""
    house.joint("VA", "upper", height="2.5 m").joint("VH", "upper", height="2.7 m")
    house.joint("VS", "upper", height="2.6 m").joint("VP", "main", height="2.4 m")
    house.joint("VS2", "upper", height="2.65 m").joint("VK", "upper", height="2.5 m")
    house.vent("va", "A1", "VA", length="3.1 m").vent("vb", "B1", "VA", length="4.2 m")
    house.vent("vab", "VA", "VS", length="1.5 m").vent("sv1", "U", "VS", length="2.9 m")
    house.vent("vp", "P1", "VP", length="2.2 m").vent("vc", "C1", "VP", length="5.6 m")
    house.vent("vpc", "VP", "VS2", length="4.6 m").vent("sv2", "VS", "VS2", length="0.3 m")
    house.vent("sv3", "VS2", "VH", length="0.3 m").vent("vk", "K1", "VK", length="5.2 m")
    house.vent("vl", "L1", "VK", length="6 m").vent("vkl", "VK", "VH", length="4.4 m")
    house.vent("vh", "VH", "T1", length="1.2 m").terminal("T1", through="roof", above="300 mm")


def write(sizing: dwv.Sizing, folder: Path) -> None:
    """The drawing, the report, each schedule for a spreadsheet and the whole result for other programs."""
    files = {"layout.json": sizing.layout.to_json(), "txt": sizing.to_text(), "sizing.json": sizing.to_json()}
    for name in get_args(dwv.ScheduleName):
        files[f"{name}.csv"] = sizing.schedule(name).to_csv()
    folder.mkdir(parents=True, exist_ok=True)
    for ending, text in files.items():
        path = folder / f"house.{ending}"
        path.write_text(text, encoding="utf-8", newline="")
        print(f"wrote {path}")


if __name__ == "__main__":
    house = dwv.size(draw())
    print(house.to_text())
    write(house, Path(sys.argv[1] if len(sys.argv) > 1 else "out"))
