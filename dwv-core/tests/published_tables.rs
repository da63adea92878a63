//! Every row of every table against its published source.
#![allow(clippy::unwrap_used)] // A check that cannot be read must fail the test.

use std::collections::BTreeMap;
use std::path::Path;

use dwv_core::Edition;
use dwv_core::edition::Limit;
use dwv_core::quantity::{FixtureUnits, Length, PipeSize};
use serde_json::{Map, Value};

/// The number of checks may grow and not fall.
const CHECKS: usize = 730;

/// The questions of the file, each with the answer expected and its source.
fn checks() -> Vec<(Map<String, Value>, String, String)> {
    let path = Path::new(env!("CARGO_MANIFEST_DIR")).join("../tests/published/npc-2015-tables.toml");
    let file: BTreeMap<String, Vec<Map<String, Value>>> =
        toml::from_str(&std::fs::read_to_string(path).unwrap()).unwrap();
    let mut checks = Vec::new();
    for mut check in file.into_values().flatten() {
        let mut take = |key: &str| check.remove(key).and_then(|value| value.as_str().map(str::to_owned)).unwrap();
        let (expect, source) = (take("expect"), take("source"));
        assert!(!source.is_empty());
        checks.push((check, expect, source));
    }
    checks
}

#[test]
fn every_check_agrees_with_its_source() {
    let edition = Edition::builtin("npc-2015").unwrap();
    let mut differences = Vec::new();
    for (question, expect, source) in checks() {
        let question = Value::Object(question).to_string();
        let obtained = edition.answer_json(&question).map_or_else(|error| error.to_string(), |answer| answer.text);
        if obtained != expect {
            differences.push(format!("{question}: expected {expect}, obtained {obtained} ({source})"));
        }
    }
    assert!(differences.is_empty(), "\n{}", differences.join("\n"));
}

/// Block D Drainage Systems, D-1.9, figure 1: the stack vent of a 3 in stack with 35 FU at its base, 3 m long, is 1-1/2 in by Table 2.5.8.4
/// (NPC 2020), and at least half of the stack.
#[test]
fn the_stack_vent_of_the_worked_example() {
    let edition = Edition::builtin("npc-2015").unwrap();
    let (load, length) = (FixtureUnits::from_number(35.0).unwrap(), Length::from_millimetres(3000));
    let answer = edition.stack_vent.size_for(PipeSize::Three, load, length, edition.pipe_sizes).unwrap();
    assert_eq!(answer.size, PipeSize::OneAndHalf);
    assert!(answer.size.nominal() + answer.size.nominal() >= PipeSize::Three.nominal());
}

#[test]
fn no_check_is_lost() {
    assert!(checks().len() >= CHECKS, "{} checks", checks().len());
}

/// Each cell of each table is asked for at least once.
#[test]
fn every_cell_is_checked() {
    let edition = Edition::builtin("npc-2015").unwrap();
    let mut asked: BTreeMap<String, usize> = BTreeMap::new();
    for (question, _, _) in checks() {
        *asked.entry(question["ask"].as_str().unwrap().to_owned()).or_default() += 1;
    }
    let kinds = &edition.fixtures.rows;
    let lengths = |rows: &mut dyn Iterator<Item = &Vec<Limit<Length>>>| rows.map(Vec::len).sum::<usize>();
    let with_value = edition.rules.texts.iter().filter(|rule| !rule.value.is_empty());
    let cells = [
        ("fixture-load", kinds.iter().map(|kind| kind.loads.len()).sum()),
        ("fixture-outlet", kinds.len()),
        ("bathroom-group", edition.bathroom_groups.len()),
        ("load-by-trap", edition.unlisted.rows.len()),
        ("semi-continuous", edition.semi_continuous.rows.len()),
        ("stack-total", edition.stack.rows.len()),
        ("stack-one-storey", edition.stack.rows.len()),
        ("branch-capacity", edition.branch.rows.len()),
        ("building-drain-capacity", edition.building_drain.rows.len() * edition.building_drain.slopes.len()),
        ("trap-arm-longest", edition.trap_arm.rows.len()),
        ("trap-arm-slope", edition.trap_arm.rows.len()),
        ("vent-for-trap", edition.vent_by_trap.rows.len()),
        ("wet-vent-capacity", 2 * edition.wet_vent.rows.len()),
        ("stack-vent-longest", lengths(&mut edition.stack_vent.rows.iter().map(|(_, row)| &row.longest))),
        ("vent-longest", lengths(&mut edition.vent_length.rows.iter().map(|row| &row.longest))),
        // Two least slopes and two least sizes are asked for in other words.
        ("rule", with_value.count() - 3),
    ];
    for (ask, cells) in cells {
        assert!(
            asked.get(ask).is_some_and(|asked| *asked >= cells),
            "{ask}: {cells} cells, {:?} checks",
            asked.get(ask)
        );
    }
}
