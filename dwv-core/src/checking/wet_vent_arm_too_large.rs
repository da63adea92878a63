//! A trap arm on a wet vent that is too large (NPC 2015, 2.5.2.1.(1)).

use super::{Case, Check, Finding, Report, Subject};
use crate::edition::FixtureClass;
use crate::network::FixtureId;
use crate::quantity::PipeSize;

pub(super) const CHECK: Check = Check {
    name: "wet-vent-arm-too-large",
    finds: "a trap arm larger than 2 in that joins a wet vent and serves no water closet",
    matters: "a large discharge fills the pipe that others breathe through",
    remedy: "give the fixture a vent of its own",
    citation: |edition| edition.rules.wet_vent_arm_most.citation,
    run,
    words,
};

fn run(case: &Case<'_>, report: &mut Report<'_>) {
    let most = case.operands.edition.rules.wet_vent_arm_most.value;
    for (index, trap) in case.operands.names.trap.iter().enumerate() {
        let class = case.operands.network.fixtures.class[index];
        let excepted = matches!(class, FixtureClass::WaterCloset | FixtureClass::EmergencyFloorDrain);
        let size = case.sizes.drain[trap.arm_end.index()];
        if trap.wet.is_some() && trap.vent.is_some() && !excepted && size > most {
            report.violation(Subject::Fixture(FixtureId::new(index)), size.index() as i64, most.index() as i64);
        }
    }
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let Subject::Fixture(fixture) = finding.subject else { return String::new() };
    let size = |index: i64| usize::try_from(index).ok().and_then(PipeSize::from_index).map_or("?", PipeSize::text);
    format!(
        "the trap arm of `{}` is {} in and joins a wet vent, at most {} in is allowed",
        case.operands.network.fixtures.id[fixture.index()],
        size(finding.found),
        size(finding.limit)
    )
}
