//! A trap arm with too many turns (NPC 2015, 2.5.6.3.).

use super::{Case, Check, Finding, Report, Subject};

pub(super) const CHECK: Check = Check {
    name: "trap-arm-turns-too-much",
    finds: "a trap arm whose stated turns add up to more than the edition allows",
    matters: "turns slow the waste, and the arm fills",
    remedy: "take bends out, or bring the vent before them",
    citation: |edition| edition.rules.trap_arm.citation,
    run,
    words,
};

fn run(case: &Case<'_>, report: &mut Report<'_>) {
    let rules = &case.operands.edition.rules;
    for arm in case.arms {
        let most = if arm.siphonic { rules.trap_arm_siphonic.value.most_turn } else { rules.trap_arm.value.most_turn };
        if arm.turns > most {
            report.violation(Subject::Fixture(arm.fixture), i64::from(arm.turns), i64::from(most));
        }
    }
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let Subject::Fixture(fixture) = finding.subject else { return String::new() };
    format!(
        "the trap arm of `{}` turns {}° in all, at most {}° is allowed",
        case.operands.network.fixtures.id[fixture.index()],
        finding.found,
        finding.limit
    )
}
