//! Random drawings that are drainage systems: trees of joints with fixtures, vents and a sewer.

use dwv_core::Layout;
use dwv_core::layout::{Drain, Fixture, Joint, Level, Sewer, Terminal, Vent};
use dwv_core::quantity::{Length, LengthUnit, Measure, Written};
use proptest::prelude::*;

/// What a random drawing is made from.
#[derive(Debug, Clone)]
pub struct Seed {
    /// For each joint: to which earlier one it drains, how it runs, how far in decimetres.
    pub joints: Vec<(prop::sample::Index, bool, u8)>,
    /// For each fixture beyond those at the ends: at which joint, of which kind, how far.
    pub fixtures: Vec<(prop::sample::Index, u8, u8)>,
    /// Which joints have a vent, how long, and which vent it joins.
    pub vents: Vec<(prop::sample::Index, u8, u8)>,
    /// How many terminals.
    pub terminals: u8,
}

pub fn seed() -> impl Strategy<Value = Seed> {
    (
        prop::collection::vec((any::<prop::sample::Index>(), prop::bool::weighted(0.4), 3_u8..40), 1..24),
        prop::collection::vec((any::<prop::sample::Index>(), 0_u8..12, 3_u8..20), 0..16),
        prop::collection::vec((any::<prop::sample::Index>(), 5_u8..120, any::<u8>()), 0..16),
        1_u8..4,
    )
        .prop_map(|(joints, fixtures, vents, terminals)| Seed { joints, fixtures, vents, terminals })
}

const KINDS: [&str; 12] = [
    "water-closet",
    "lavatory",
    "bathtub",
    "shower",
    "kitchen-sink",
    "clothes-washer",
    "laundry-tray",
    "floor-drain",
    "bidet",
    "dishwasher",
    "water-closet",
    "lavatory",
];

fn decimetres(count: i64) -> Measure {
    Measure::Written(Written::new(Length::from_millimetres(count * 100), LengthUnit::Metre))
}

/// The level that a height in decimetres belongs to, and the height above its floor.
fn level(height: i64) -> (String, Measure) {
    let storey = (height + 5).div_euclid(29).clamp(0, 7);
    (format!("level {storey}"), decimetres(height - storey * 29))
}

/// Draws what the seed describes.
pub fn draw(seed: &Seed) -> Layout {
    let mut builder = Layout::builder("random", "npc-2015").add(Sewer::new("J00").invert("-3 m"));
    for storey in 0..8 {
        builder = builder.add(Level::new(format!("level {storey}"), decimetres(storey * 29)));
    }
    // Joint 0 is the sewer connection.
    let mut heights: Vec<i64> = vec![-12];
    let mut feeds: Vec<bool> = vec![false];
    for (index, (to, vertical, far)) in seed.joints.iter().enumerate() {
        let to = to.index(heights.len());
        let height = heights[to] + if *vertical { i64::from(*far) } else { 0 };
        let (from_id, to_id) = (format!("J{:02}", index + 1), format!("J{to:02}"));
        let id = format!("d{:02}", index + 1);
        builder = if *vertical {
            builder.add(Drain::vertical(id.as_str(), from_id.as_str(), to_id.as_str()))
        } else {
            let drain = Drain::level(id.as_str(), from_id.as_str(), to_id.as_str()).length(decimetres(i64::from(*far)));
            builder.add(if height < 0 { drain.underground() } else { drain })
        };
        heights.push(height);
        feeds[to] = true;
        feeds.push(false);
    }
    for (index, height) in heights.iter().enumerate() {
        let (level, above) = level(*height);
        builder = builder.add(Joint::new(format!("J{index:02}"), level).height(above));
    }
    // A fixture at each end, and more anywhere but at the sewer.
    let ends = (1..heights.len()).filter(|joint| !feeds[*joint]).map(|joint| (joint, (joint % 12) as u8, 8));
    let more = seed.fixtures.iter().map(|(at, kind, far)| (1 + at.index(heights.len() - 1), *kind, *far));
    for (index, (joint, kind, far)) in ends.chain(more).enumerate() {
        let (level, above) = level(heights[joint]);
        let id = format!("F{index:02}");
        let kind = KINDS[usize::from(kind)];
        builder = builder.add(Fixture::new(id.as_str(), kind, level).height(above)).add(
            Drain::level(format!("f{index:02}"), id.as_str(), format!("J{joint:02}"))
                .length(decimetres(i64::from(far))),
        );
    }
    builder = vents(builder, seed, &heights);
    builder.build().expect("a random drawing can be built")
}

/// Vents, each to a terminal or to the foot of an earlier vent's way.
fn vents(
    mut builder: dwv_core::layout::LayoutBuilder,
    seed: &Seed,
    heights: &[i64],
) -> dwv_core::layout::LayoutBuilder {
    let mut vented = vec![false; heights.len()];
    // Collars where vents meet; the first ones lead to a terminal each.
    let mut collars = 0_usize;
    let mut drawn = 0_usize;
    let terminals = usize::from(seed.terminals);
    for (at, far, to) in &seed.vents {
        let joint = 1 + at.index(heights.len() - 1);
        if std::mem::replace(&mut vented[joint], true) {
            continue;
        }
        let collar = if collars < terminals || to % 3 == 0 { collars } else { usize::from(*to) % collars };
        if collar == collars {
            collars += 1;
            let onward =
                if collar < terminals { format!("T{collar:02}") } else { format!("V{:02}", usize::from(*to) % collar) };
            builder = builder.add(Joint::new(format!("V{collar:02}"), "level 7")).add(
                Vent::new(format!("w{collar:02}"), format!("V{collar:02}"), onward)
                    .length(decimetres(i64::from(*to % 50))),
            );
            if collar < terminals {
                builder = builder.add(Terminal::roof(format!("T{collar:02}")).above("300 mm"));
            }
        }
        builder = builder.add(
            Vent::new(format!("v{drawn:02}"), format!("J{joint:02}"), format!("V{collar:02}"))
                .length(decimetres(i64::from(*far))),
        );
        drawn += 1;
    }
    builder
}
