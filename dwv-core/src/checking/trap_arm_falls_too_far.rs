//! A trap arm that falls more than its inside diameter (NPC 2015, 2.5.6.3.(1)).

use super::{Case, Check, Finding, Report, Subject};

pub(super) const CHECK: Check = Check {
    name: "trap-arm-falls-too-far",
    finds: "a trap arm that falls more than its inside diameter",
    matters: "the vent opening lies below the trap weir and the arm acts as a siphon",
    remedy: "shorten the arm, lessen its slope, or move the vent before the drop",
    citation: |edition| edition.rules.trap_arm.citation,
    run,
    words,
};

/// The nominal size stands for the inside diameter, which differs from it by a few millimetres with the material.
fn run(case: &Case<'_>, report: &mut Report<'_>) {
    let diameters = i64::from(case.operands.edition.rules.trap_arm.value.most_fall_diameters);
    for arm in case.arms.iter().filter(|arm| !arm.siphonic) {
        let most = case.sizes.drain[arm.end.index()].nominal().nanometres() * diameters;
        if arm.fall.nanometres() > most {
            report.violation(Subject::Fixture(arm.fixture), arm.fall.nanometres(), most);
        }
    }
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let Subject::Fixture(fixture) = finding.subject else { return String::new() };
    format!(
        "the trap arm of `{}` falls {}, at most {} is allowed, its diameter",
        case.operands.network.fixtures.id[fixture.index()],
        case.length(finding.found),
        case.length(finding.limit)
    )
}
