//! A trap arm shorter than two pipe sizes (NPC 2015, 2.5.6.3.(1)).

use super::{Case, Check, Finding, Report, Subject};

pub(super) const CHECK: Check = Check {
    name: "trap-arm-too-short",
    finds: "a trap arm that is shorter than two of its sizes",
    matters: "waste rushes past the vent opening and draws the seal with it",
    remedy: "move the vent at least two pipe sizes from the trap",
    citation: |edition| edition.rules.trap_arm.citation,
    run,
    words,
};

fn run(case: &Case<'_>, report: &mut Report<'_>) {
    let sizes = i64::from(case.operands.edition.rules.trap_arm.value.least_sizes);
    for arm in case.arms.iter().filter(|arm| !arm.siphonic && !arm.length_missing) {
        let least = case.sizes.drain[arm.end.index()].nominal().nanometres() * sizes;
        if arm.length.nanometres() < least {
            report.violation(Subject::Fixture(arm.fixture), arm.length.nanometres(), least);
        }
    }
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let Subject::Fixture(fixture) = finding.subject else { return String::new() };
    format!(
        "the trap arm of `{}` is {} long, at least {} is needed, two pipe sizes",
        case.operands.network.fixtures.id[fixture.index()],
        case.length(finding.found),
        case.length(finding.limit)
    )
}
