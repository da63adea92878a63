//! A bathroom group that lacks a fixture.

use super::{Case, Check, Finding, Report, Severity, Subject};

pub(super) const CHECK: Check = Check {
    name: "bathroom-group-incomplete",
    finds: "fixtures marked as a bathroom group that are not a whole one",
    matters: "they count one by one, which the drawing may not have meant",
    remedy: "mark one water closet, one lavatory and one bathtub or one-head shower with the same `group`",
    citation: |edition| edition.rules.bathroom_group.citation,
    run,
    words,
};

fn run(case: &Case<'_>, report: &mut Report<'_>) {
    for group in case.operands.loads.incomplete_groups() {
        report.add(Severity::Caution, Subject::Group(*group as u32), 0, 0);
    }
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let Subject::Group(group) = finding.subject else { return String::new() };
    format!(
        "the bathroom group `{}` lacks a water closet, a lavatory or a bathtub or shower, so its fixtures count one by one",
        case.operands.network.groups[group as usize].name
    )
}
