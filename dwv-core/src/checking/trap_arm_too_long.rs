//! A trap arm longer than its table allows (NPC 2015, Table 2.5.6.3.).

use super::{Case, Check, Finding, Report, Subject};

pub(super) const CHECK: Check = Check {
    name: "trap-arm-too-long",
    finds: "a trap arm that is longer than the edition allows for its size",
    matters: "the arm fills and siphons the trap before air reaches it",
    remedy: "bring the vent nearer, or make the trap arm larger",
    citation: |edition| edition.rules.trap_arm.citation,
    run,
    words,
};

fn run(case: &Case<'_>, report: &mut Report<'_>) {
    for arm in case.arms.iter().filter(|arm| !arm.siphonic) {
        let size = case.sizes.drain[arm.end.index()];
        if let Some(row) = case.operands.edition.trap_arm.row(size)
            && arm.length > row.longest
        {
            report.violation(Subject::Fixture(arm.fixture), arm.length.nanometres(), row.longest.nanometres());
        }
    }
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let Subject::Fixture(fixture) = finding.subject else { return String::new() };
    format!(
        "the trap arm of `{}` is {} long, at most {} is allowed for its size",
        case.operands.network.fixtures.id[fixture.index()],
        case.length(finding.found),
        case.length(finding.limit)
    )
}
