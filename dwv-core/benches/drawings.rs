//! Drawings to measure with: houses of fifty pipes, and many of them on one sewer.

use std::fmt::Write;

/// The drains and vents of one house.
pub const PIPES_OF_A_HOUSE: usize = 50;

/// A list of the layout and what is added to it.
#[derive(Default)]
struct Lists {
    fixtures: String,
    joints: String,
    drains: String,
    vents: String,
    terminals: String,
}

fn item(list: &mut String, text: std::fmt::Arguments<'_>) {
    if !list.is_empty() {
        list.push_str(",\n");
    }
    // Writing to a text cannot fail.
    let _ = list.write_fmt(text);
}

impl Lists {
    fn fixture(&mut self, house: usize, id: &str, kind: &str, level: &str, joint: &str, length: u32) {
        item(
            &mut self.fixtures,
            format_args!(r#"{{"id":"{house}-{id}","kind":"{kind}","level":"{level}","height":"0.3 m"}}"#),
        );
        item(
            &mut self.drains,
            format_args!(
                r#"{{"id":"{house}-{id}-arm","from":"{house}-{id}","to":"{house}-{joint}","runs":"level","length":"{length} mm"}}"#
            ),
        );
    }

    fn joint(&mut self, house: usize, id: &str, level: &str, height: &str) {
        item(&mut self.joints, format_args!(r#"{{"id":"{house}-{id}","level":"{level}","height":"{height}"}}"#));
    }

    fn level(&mut self, house: usize, from: &str, to: &str, length: u32) {
        item(
            &mut self.drains,
            format_args!(
                r#"{{"id":"{house}-{from}-on","from":"{house}-{from}","to":"{house}-{to}","runs":"level","length":"{length} mm"}}"#
            ),
        );
    }

    fn vertical(&mut self, house: usize, from: &str, to: &str) {
        item(
            &mut self.drains,
            format_args!(
                r#"{{"id":"{house}-{from}-down","from":"{house}-{from}","to":"{house}-{to}","runs":"vertical"}}"#
            ),
        );
    }

    fn vent(&mut self, house: usize, from: &str, to: &str, length: u32) {
        item(
            &mut self.vents,
            format_args!(
                r#"{{"id":"{house}-{from}-vent","from":"{house}-{from}","to":"{house}-{to}","length":"{length} mm"}}"#
            ),
        );
    }

    /// A bathroom on a level: three fixtures, seven pipes.
    fn bathroom(&mut self, house: usize, room: &str, level: &str, to: &str) {
        let joint = |number: u32| format!("{room}{number}");
        self.joint(house, &joint(1), level, "0.25 m");
        self.joint(house, &joint(2), level, "-0.2 m");
        self.joint(house, &joint(3), level, "-0.25 m");
        self.fixture(house, &format!("{room}-lav"), "lavatory", level, &joint(1), 600);
        self.fixture(house, &format!("{room}-bath"), "bathtub", level, &joint(2), 1100);
        self.fixture(house, &format!("{room}-wc"), "water-closet", level, &joint(3), 800);
        self.vertical(house, &joint(1), &joint(2));
        self.level(house, &joint(2), &joint(3), 1200);
        self.level(house, &joint(3), to, 900);
        self.vent(house, &joint(1), "attic", 8200);
    }

    /// A sink with a stack of its own.
    fn sink(&mut self, house: usize, id: &str, kind: &str, to: &str) {
        let (top, foot) = (format!("{id}-top"), format!("{id}-foot"));
        self.joint(house, &top, "main", "0.25 m");
        self.joint(house, &foot, "basement", "-0.5 m");
        self.fixture(house, id, kind, "main", &top, 900);
        self.vertical(house, &top, &foot);
        self.level(house, &foot, to, 2500);
        self.vent(house, &top, "attic", 5200);
    }

    /// A house of fifty pipes; its last joint is `house-street`.
    fn house(&mut self, house: usize) {
        self.joint(house, "attic", "upper", "2.5 m");
        self.joint(house, "stack-top", "upper", "-0.3 m");
        self.joint(house, "stack-main", "main", "-0.3 m");
        self.joint(house, "stack-foot", "basement", "-0.6 m");
        self.joint(house, "north", "basement", "-0.62 m");
        self.joint(house, "south", "basement", "-0.65 m");
        self.joint(house, "wall", "basement", "-0.7 m");
        for room in ["east", "west"] {
            self.bathroom(house, room, "upper", "stack-top");
        }
        self.bathroom(house, "hall", "main", "stack-main");
        self.bathroom(house, "cellar", "basement", "south");
        self.vertical(house, "stack-top", "stack-main");
        self.vertical(house, "stack-main", "stack-foot");
        for (id, kind) in [("kitchen", "kitchen-sink"), ("washer", "clothes-washer"), ("tray", "laundry-tray")] {
            self.sink(house, id, kind, "north");
        }
        self.fixture(house, "floor", "floor-drain", "basement", "south", 1700);
        self.fixture(house, "cellar-shower", "shower", "basement", "cellar2", 1300);
        self.level(house, "stack-foot", "north", 2100);
        self.level(house, "north", "south", 1800);
        self.level(house, "south", "wall", 2600);
        self.vent(house, "stack-top", "attic", 3100);
        item(
            &mut self.vents,
            format_args!(r#"{{"id":"{house}-roof","from":"{house}-attic","to":"{house}-open","length":"1.2 m"}}"#),
        );
        item(&mut self.terminals, format_args!(r#"{{"id":"{house}-open","through":"roof","above":"300 mm"}}"#));
        item(
            &mut self.drains,
            format_args!(
                r#"{{"id":"{house}-sewer","from":"{house}-wall","to":"{house}-street","runs":"level","length":"9 m","underground":true,"outside":true}}"#
            ),
        );
    }
}

/// The layout file of so many houses on one sewer.
pub fn street(houses: usize) -> String {
    let mut lists = Lists::default();
    for house in 0..houses {
        lists.house(house);
        lists.joint(house, "street", "basement", "-1 m");
        if house > 0 {
            item(
                &mut lists.drains,
                format_args!(
                    r#"{{"id":"street-{house}","from":"{house}-street","to":"{}-street","runs":"level","length":"12 m","outside":true}}"#,
                    house - 1
                ),
            );
        }
    }
    format!(
        r#"{{"format":"dwv-layout/1","name":"street","edition":"npc-2015","frost_can_close_vents":true,
"levels":[{{"id":"basement","floor":"-2.7 m"}},{{"id":"main","floor":"0 m"}},{{"id":"upper","floor":"2.9 m"}},{{"id":"roof","floor":"5.8 m"}}],
"fixtures":[{}],
"joints":[{}],
"drains":[{}],
"vents":[{}],
"terminals":[{}],
"sewer":{{"at":"0-street","invert":"-4 m"}}}}"#,
        lists.fixtures, lists.joints, lists.drains, lists.vents, lists.terminals
    )
}
