//! A layout that leaves nothing out.

use crate::layout::{
    Cleanout, Drain, Fixture, Format, Grounds, Joint, Layout, Level, Runs, Sewer, StatedName, Terminal, Through, Valve,
    Vent,
};
use crate::quantity::{FixtureUnits, FlowRate, LengthUnit, Measure, PipeSize, Slope};

/// A layout in which every field of every type is set. A new field does not compile until it is set here too, and
/// then the tests ask for it in the description.
pub(super) fn full() -> Layout {
    let length = Measure::parse("1.2 m").unwrap();
    let at = Some([length, Measure::Number(3.25)]);
    let flow = FlowRate::parse("0.3 L/s").unwrap();
    Layout {
        schema: Some("dwv-layout-1.schema.json".to_owned()),
        format: Format::Version1,
        name: "Heron".into(),
        edition: "npc-2015".into(),
        units: Some(LengthUnit::Metre),
        frost_can_close_vents: Some(true),
        pipe_sizes: Some(vec![PipeSize::OneAndHalf, PipeSize::Three]),
        building_drain_ends_at: Some("J1".into()),
        levels: vec![Level { id: "main".into(), floor: Measure::parse("-3'-6 1/2\"").unwrap() }],
        fixtures: vec![Fixture {
            id: "KS".into(),
            kind: "kitchen-sink".into(),
            level: "main".into(),
            at,
            height: Some(length),
            trap: Some(PipeSize::OneAndHalf),
            load: Some(FixtureUnits::from_thousandths(1500)),
            continuous_flow: Some(flow),
            semi_continuous_flow: Some(flow),
            group: Some("bath".into()),
            outlet_length: Some(length),
            future: true,
        }],
        joints: vec![Joint { id: "J1".into(), level: "main".into(), at, height: Some(length) }],
        drains: vec![Drain {
            id: "d1".into(),
            from: "KS".into(),
            to: "J1".into(),
            runs: Runs::Sloped,
            length: Some(length),
            drop: Some(length),
            slope: Some(Slope::parse("1:50").unwrap()),
            size: Some(PipeSize::Two),
            name: Some(StatedName::TrapArm),
            underground: true,
            outside: true,
            turns: Some(90),
        }],
        vents: vec![Vent {
            id: "v1".into(),
            from: "J1".into(),
            to: "T1".into(),
            length: Some(length),
            size: Some(PipeSize::Three),
            name: Some(StatedName::StackVent),
        }],
        terminals: vec![Terminal {
            id: "T1".into(),
            through: Through::Roof,
            level: Some("main".into()),
            at,
            height: Some(length),
            above: Some(length),
        }],
        valves: vec![Valve {
            id: "A1".into(),
            grounds: Some(Grounds::Island),
            level: Some("main".into()),
            at,
            height: Some(length),
        }],
        cleanouts: vec![Cleanout { id: "C1".into(), at: "J1".into() }],
        sewer: Sewer { at: "J1".into(), invert: Some(length) },
    }
}
