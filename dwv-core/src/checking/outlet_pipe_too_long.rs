//! A fixture outlet pipe that is too long (NPC 2015, 2.4.8.2.).

use super::{Case, Check, Finding, Report, Subject};
use crate::network::FixtureId;

pub(super) const CHECK: Check = Check {
    name: "outlet-pipe-too-long",
    finds: "a pipe between a fixture and its trap that is too long",
    matters: "waste gathers speed and blows through the seal; the pipe fouls and smells",
    remedy: "move the trap nearer to the fixture",
    citation: |edition| edition.rules.outlet_pipe_longest.citation,
    run,
    words,
};

fn run(case: &Case<'_>, report: &mut Report<'_>) {
    let most = case.operands.edition.rules.outlet_pipe_longest.value;
    for (index, length) in case.operands.network.fixtures.outlet_length.iter().enumerate() {
        if let Some(length) = length
            && *length > most
        {
            report.violation(Subject::Fixture(FixtureId::new(index)), length.nanometres(), most.nanometres());
        }
    }
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let Subject::Fixture(fixture) = finding.subject else { return String::new() };
    format!(
        "the outlet pipe of `{}` is {} long, at most {} is allowed",
        case.operands.network.fixtures.id[fixture.index()],
        case.length(finding.found),
        case.length(finding.limit)
    )
}
