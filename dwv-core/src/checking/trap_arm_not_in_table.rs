//! A trap arm of a size that the table does not list.

use super::{Case, Check, Finding, Report, Severity, Subject};
use crate::quantity::PipeSize;

pub(super) const CHECK: Check = Check {
    name: "trap-arm-not-in-table",
    finds: "a trap arm whose size the edition's table does not list",
    matters: "its longest length is not known, so nobody can say that it holds",
    remedy: "ask the authority, or take a size of the table",
    citation: |edition| edition.rules.trap_arm.citation,
    run,
    words,
};

fn run(case: &Case<'_>, report: &mut Report<'_>) {
    for arm in case.arms.iter().filter(|arm| !arm.siphonic) {
        let size = case.sizes.drain[arm.end.index()];
        if case.operands.edition.trap_arm.row(size).is_none() {
            report.add(Severity::CannotDecide, Subject::Fixture(arm.fixture), size.index() as i64, 0);
        }
    }
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let Subject::Fixture(fixture) = finding.subject else { return String::new() };
    let size = usize::try_from(finding.found).ok().and_then(PipeSize::from_index);
    format!(
        "the trap arm of `{}` is {} in, which the table of longest trap arms does not list",
        case.operands.network.fixtures.id[fixture.index()],
        size.map_or("?", PipeSize::text)
    )
}
