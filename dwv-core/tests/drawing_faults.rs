//! Drawings that are no drainage system: every fault with its place, all together, each once.
#![allow(clippy::unwrap_used)] // A layout that cannot be read must fail the test.

use std::path::Path;

use dwv_core::layout::{Drain, Joint, Vent};
use dwv_core::quantity::{FixtureUnits, Measure, PipeSize};
use dwv_core::{Edition, Error, Layout, Network};

fn house() -> Layout {
    let file = Path::new(env!("CARGO_MANIFEST_DIR")).join("../tests/cases/one-soil-stack.layout.json");
    Layout::from_json(&std::fs::read(file).unwrap()).unwrap()
}

fn refused(layout: &Layout) -> Error {
    Network::new(layout, &Edition::builtin("npc-2015").unwrap()).unwrap_err()
}

fn drain<'a>(layout: &'a mut Layout, id: &str) -> &'a mut Drain {
    layout.drains.iter_mut().find(|drain| drain.id == id).unwrap()
}

fn joint<'a>(layout: &'a mut Layout, id: &str) -> &'a mut Joint {
    layout.joints.iter_mut().find(|joint| joint.id == id).unwrap()
}

fn measure(text: &str) -> Measure {
    Measure::parse(text).unwrap()
}

/// What is changed, and the faults that must be told: code, path, a few words of the message or of the help.
type Broken = (&'static str, fn(&mut Layout), &'static [(&'static str, &'static str, &'static str)]);

const BROKEN: [Broken; 31] = [
    (
        "a vent shorter than its rise",
        |it| it.vents[0].length = Some(measure("1 m")),
        &[("contradiction", "vents[0].length", "shorter than the 1.780 m")],
    ),
    (
        "an unknown joint",
        |it| drain(it, "a").to = "UU".into(),
        &[("unknown-id", "drains[3].to", "no joint has the id `UU`")],
    ),
    (
        "an unknown level",
        |it| it.fixtures[0].level = "uper".into(),
        &[("unknown-id", "fixtures[0].level", "did you mean `upper`?")],
    ),
    (
        "an unknown kind",
        |it| it.fixtures[1].kind = "lavatry".into(),
        &[("unknown-kind", "fixtures[1].kind", "did you mean `lavatory`?")],
    ),
    (
        "a repeated id",
        |it| it.joints[0].id = "LAV".into(),
        &[("duplicate-id", "joints[0].id", "already that of fixtures[1]"), ("unknown-id", "drains[0].to", "`A1`")],
    ),
    (
        "a repeated level",
        |it| it.levels[1].id = "main".into(),
        &[
            ("duplicate-id", "levels[1].id", "another level"),
            ("unknown-id", "fixtures[0].level", "no level has the id `upper`"),
        ],
    ),
    (
        "an empty id",
        |it| it.cleanouts.push(dwv_core::layout::Cleanout { id: " ".into(), at: "F".into() }),
        &[("bad-id", "cleanouts[0].id", "empty")],
    ),
    ("drains in a circle", |it| drain(it, "bd").to = "U".into(), &[("cycle", "drains[5]", "in a circle")]),
    ("a drain to itself", |it| drain(it, "a").to = "A2".into(), &[("cycle", "drains[3]", "in a circle: `a`")]),
    (
        "no way to the sewer",
        |it| it.drains.retain(|drain| drain.id != "bd"),
        &[("reaches-no-sewer", "drains[5].to", "from the joint `F`")],
    ),
    (
        "a fixture without a drain",
        |it| it.drains.retain(|drain| drain.id != "wc"),
        &[("reaches-no-sewer", "fixtures[0]", "no drain leaves it")],
    ),
    (
        "a drain from the sewer",
        |it| it.sewer.at = "A1".into(),
        &[("wrong-end", "drains[1].from", "where the piping ends")],
    ),
    (
        "two ways down",
        |it| {
            let second = Drain { id: "b".into(), to: "F".into(), ..drain(it, "a").clone() };
            it.drains.push(second);
        },
        &[("two-ways-down", "drains[8].from", "by `a` and by `b`")],
    ),
    (
        "two ways up",
        |it| {
            let second = Vent { id: "vb".into(), ..it.vents[0].clone() };
            it.vents.push(second);
        },
        &[("two-ways-up", "vents[3].from", "two vents leave")],
    ),
    (
        "a vent without air",
        |it| it.vents.retain(|vent| vent.id != "sv2"),
        &[
            ("vent-without-air", "vents[0].to", "no vent leads on from the joint `V`"),
            ("wrong-end", "terminals[0]", "no vent ends at the terminal"),
        ],
    ),
    (
        "vents in a circle",
        |it| it.vents[2].to = "V".into(),
        &[("cycle", "vents[2]", "circle"), ("wrong-end", "terminals[0]", "")],
    ),
    ("a vent to a fixture", |it| it.vents[0].to = "WC".into(), &[("wrong-end", "vents[0].to", "is a fixture")]),
    (
        "two vents at one terminal",
        |it| it.vents[0].to = "T".into(),
        &[("wrong-end", "vents[2].to", "more than one vent")],
    ),
    ("a vent from nowhere", |it| it.vents[0].from = "X".into(), &[("unknown-id", "vents[0].from", "`X`")]),
    (
        "a dead end",
        |it| {
            let far = Joint { id: "X".into(), ..joint(it, "F").clone() };
            it.joints.push(far);
            let dead = Drain { id: "x".into(), from: "X".into(), ..drain(it, "bd").clone() };
            it.drains.push(dead);
        },
        &[("dead-end", "drains[8].from", "nothing drains into it")],
    ),
    (
        "a negative length",
        |it| drain(it, "a").length = Some(measure("-1 m")),
        &[("out-of-range", "drains[3].length", "cannot be `-1 m`")],
    ),
    (
        "an absurd length",
        |it| drain(it, "a").length = Some(measure("1001 m")),
        &[("out-of-range", "drains[3].length", "0 m to 1000 m")],
    ),
    (
        "a bare number",
        |it| drain(it, "a").length = Some(Measure::Number(3.0)),
        &[("wrong-quantity", "drains[3].length", "no unit")],
    ),
    (
        "not a number",
        |it| {
            it.units = Some(dwv_core::quantity::LengthUnit::Metre);
            drain(it, "a").length = Some(Measure::Number(f64::NAN));
        },
        &[("wrong-quantity", "drains[3].length", "NaN")],
    ),
    (
        "a vertical that goes up",
        |it| joint(it, "F").height = Some(measure("9 m")),
        &[
            ("goes-up", "drains[5].to", "not below"),
            ("contradiction", "drains[6].runs", "drops farther than it is long"),
        ],
    ),
    (
        "a level drain that goes up",
        |it| joint(it, "W").height = Some(measure("0 m")),
        &[("goes-up", "drains[6].to", "does not go up")],
    ),
    (
        "positions against a length",
        |it| {
            joint(it, "A2").at = Some([measure("0 m"), measure("0 m")]);
            joint(it, "U").at = Some([measure("0 m"), measure("5 m")]);
        },
        &[("contradiction", "drains[3].length", "shorter than the 5.000 m")],
    ),
    (
        "heights against a drop",
        |it| drain(it, "ss").drop = Some(measure("2 m")),
        &[("contradiction", "drains[5].drop", "2.000 m high")],
    ),
    (
        "a slope on a vertical",
        |it| drain(it, "ss").slope = Some(dwv_core::quantity::Slope::parse("1:50").unwrap()),
        &[("contradiction", "drains[5].slope", "no slope")],
    ),
    (
        "a load stated twice",
        |it| {
            it.fixtures[0].load = Some(FixtureUnits::from_thousandths(1000));
            it.fixtures[0].continuous_flow = Some(dwv_core::quantity::FlowRate::parse("1 L/s").unwrap());
        },
        &[("contradiction", "fixtures[0].continuous_flow", "stated twice")],
    ),
    (
        "sizes that end too early",
        |it| it.pipe_sizes = Some(vec![PipeSize::Two, PipeSize::Three]),
        &[("out-of-range", "pipe_sizes", "below 4 in")],
    ),
];

#[test]
fn each_fault_is_told_once_with_its_place() {
    let mut differences = Vec::new();
    for (what, change, expected) in BROKEN {
        let mut layout = house();
        change(&mut layout);
        let error = refused(&layout);
        for (code, path, words) in expected {
            let told = error.faults().iter().filter(|fault| fault.code.name() == *code && fault.path == *path);
            let told: Vec<String> = told.map(ToString::to_string).collect();
            if told.len() != 1 || !told[0].contains(words) {
                differences.push(format!("{what}: expected {code} {path} {words:?}, told {error}"));
            }
        }
        let lines: std::collections::BTreeSet<String> = error.faults().iter().map(ToString::to_string).collect();
        assert_eq!(lines.len(), error.faults().len(), "{what}: {error}");
    }
    assert!(differences.is_empty(), "\n{}", differences.join("\n"));
}

#[test]
fn all_faults_are_told_together() {
    let mut layout = house();
    layout.fixtures[0].kind = "throne".into();
    drain(&mut layout, "a").length = Some(measure("-1 m"));
    layout.vents[0].to = "Q".into();
    layout.sewer.invert = Some(measure("-20000 m"));
    let error = refused(&layout);
    assert!(error.total() >= 4, "{error}");
}

/// Hundreds of thousands of joints in a circle, or leading nowhere, are told in a few lines.
#[test]
fn very_many_joints_are_told_in_a_few_lines() {
    let mut layout = house();
    let (plain, pipe) = (joint(&mut layout, "F").clone(), drain(&mut layout, "bd").clone());
    let count = 300_000;
    for number in 0..count {
        layout.joints.push(Joint { id: format!("X{number}").into(), ..plain.clone() });
        let to = format!("X{}", (number + 1) % count).into();
        layout.drains.push(Drain {
            id: format!("x{number}").into(),
            from: format!("X{number}").into(),
            to,
            ..pipe.clone()
        });
    }
    let error = refused(&layout);
    assert_eq!(error.total(), 1, "{error}");
    assert!(error.to_string().contains("and 299994 more"), "{error}");
    layout.drains.pop();
    let error = refused(&layout);
    assert_eq!(error.total(), 2, "a way that ends and a drain that begins with nothing: {error}");
}
