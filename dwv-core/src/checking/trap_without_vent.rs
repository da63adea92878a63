//! A trap that no vent protects (NPC 2015, 2.5.1.1.).

use super::{Arm, Case, Check, Finding, Report, Severity, Subject};
use crate::edition::FixtureClass;
use crate::network::FixtureId;
use crate::quantity::Length;

pub(super) const CHECK: Check = Check {
    name: "trap-without-vent",
    finds: "a trap that no vent protects",
    matters: "the seal is siphoned or blown out and sewer gas enters the room",
    remedy: "connect a vent to its fixture drain before other waste joins, or where it joins a drain that is vented",
    citation: |edition| edition.rules.trap_needs_vent.citation,
    run,
    words,
};

/// What kept the exemption of floor drains from holding.
const NO_EXEMPTION: i64 = 0;
const TRAP_TOO_SMALL: i64 = 1;
const DRAIN_TOO_SHORT: i64 = 2;
const FALLS_TOO_FAR: i64 = 3;
const LENGTH_UNKNOWN: i64 = 4;

fn run(case: &Case<'_>, report: &mut Report<'_>) {
    for (index, trap) in case.operands.names.trap.iter().enumerate() {
        let fixture = FixtureId::new(index);
        if trap.vent.is_some() {
            continue;
        }
        match exemption(case, fixture) {
            None => {}
            Some(LENGTH_UNKNOWN) => {
                report.add(Severity::CannotDecide, Subject::Fixture(fixture), LENGTH_UNKNOWN, 0);
            }
            Some(why) => report.violation(Subject::Fixture(fixture), why, 0),
        }
    }
}

/// Whether a trap without a vent is exempt as a floor drain (NPC 2015, 2.5.1.1.(3)); none when it is.
fn exemption(case: &Case<'_>, fixture: FixtureId) -> Option<i64> {
    let operands = &case.operands;
    let fixtures = &operands.network.fixtures;
    let class = fixtures.class[fixture.index()];
    if !matches!(class, FixtureClass::FloorDrain | FixtureClass::EmergencyFloorDrain) {
        return Some(NO_EXEMPTION);
    }
    let rule = operands.edition.rules.floor_drain_unvented.value;
    let way = Arm::measure(operands, case.grades, fixture, operands.names.trap[fixture.index()].arm_end);
    if fixtures.trap[fixture.index()].value < rule.least_trap {
        return Some(TRAP_TOO_SMALL);
    }
    if way.length_missing {
        return Some(LENGTH_UNKNOWN);
    }
    if way.length < rule.least_length {
        return Some(DRAIN_TOO_SHORT);
    }
    let size = case.sizes.drain[way.end.index()].nominal();
    let most = Length::from_nanometres(size.nanometres().saturating_mul(i64::from(rule.most_fall_sizes)));
    (way.fall > most).then_some(FALLS_TOO_FAR)
}

/// Whether a trap needs no vent.
pub(crate) fn is_exempt(case: &Case<'_>, fixture: FixtureId) -> bool {
    case.operands.names.trap[fixture.index()].vent.is_none() && exemption(case, fixture).is_none()
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let Subject::Fixture(fixture) = finding.subject else { return String::new() };
    let network = case.operands.network;
    let id = &network.fixtures.id[fixture.index()];
    let end = case.operands.names.trap[fixture.index()].arm_end;
    let joint = &network.drains.to[end.index()];
    let rule = case.operands.edition.rules.floor_drain_unvented.value;
    let why = match finding.found {
        TRAP_TOO_SMALL => format!("; as a floor drain it would need a trap of {} in", rule.least_trap),
        DRAIN_TOO_SHORT => format!(
            "; as a floor drain it would need a fixture drain of {}",
            rule.least_length.rounded(case.length_unit())
        ),
        FALLS_TOO_FAR => {
            "; its fixture drain falls more than its size, so it is not exempt as a floor drain".to_owned()
        }
        LENGTH_UNKNOWN => "; whether it is exempt as a floor drain depends on a length that is not stated".to_owned(),
        _ => String::new(),
    };
    format!("no vent protects the trap of `{id}`: no air reaches `{joint}`{why}")
}
