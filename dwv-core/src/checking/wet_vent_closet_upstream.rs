//! A fixture that joins a wet vent below a water closet (NPC 2015, 2.5.2.1.(1)).

use super::{Case, Check, Finding, Report, Subject};
use crate::edition::FixtureClass;
use crate::network::FixtureId;

pub(super) const CHECK: Check = Check {
    name: "wet-vent-closet-upstream",
    finds: "a fixture that joins a wet vent downstream of a water closet",
    matters: "the closet's discharge fills the pipe that the fixture breathes through",
    remedy: "let the water closet join the wet vent last, or vent the fixture by itself",
    citation: |edition| edition.rules.wet_vent_order.citation,
    run,
    words,
};

/// Two closets may join at one level; any other fixture below a closet is found.
fn run(case: &Case<'_>, report: &mut Report<'_>) {
    let operands = &case.operands;
    let fixtures = &operands.network.fixtures;
    for (index, trap) in operands.names.trap.iter().enumerate() {
        let Some(wet) = trap.wet.filter(|_| fixtures.class[index] != FixtureClass::WaterCloset) else { continue };
        if operands.loads.water_closets[wet.index()] > 0 {
            report.violation(Subject::Fixture(FixtureId::new(index)), wet.index() as i64, 0);
        }
    }
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let Subject::Fixture(fixture) = finding.subject else { return String::new() };
    let wet = usize::try_from(finding.found).unwrap_or(0);
    format!(
        "`{}` is wet vented through the drain `{}`, which a water closet drains through",
        case.operands.network.fixtures.id[fixture.index()],
        case.operands.network.drains.id[wet]
    )
}
