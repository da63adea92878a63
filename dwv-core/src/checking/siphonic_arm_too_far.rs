//! A water closet too far from its vent (NPC 2015, 2.5.6.3.(2)).

use super::{Case, Check, Finding, Report, Subject};

pub(super) const CHECK: Check = Check {
    name: "siphonic-arm-too-far",
    finds: "a siphonic fixture whose vent is too far away or too far down",
    matters: "its own discharge siphons the trap dry",
    remedy: "bring the vent nearer to the fixture",
    citation: |edition| edition.rules.trap_arm_siphonic.citation,
    run,
    words,
};

const VERTICAL: i64 = 1 << 62;

/// The vertical way is marked in the limit, which is far below that mark.
fn run(case: &Case<'_>, report: &mut Report<'_>) {
    let limits = case.operands.edition.rules.trap_arm_siphonic.value;
    for arm in case.arms.iter().filter(|arm| arm.siphonic) {
        let horizontal = arm.length - arm.vertical;
        if horizontal > limits.most_horizontal {
            let (found, limit) = (horizontal.nanometres(), limits.most_horizontal.nanometres());
            report.violation(Subject::Fixture(arm.fixture), found, limit);
        }
        if arm.vertical > limits.most_vertical {
            let (found, limit) = (arm.vertical.nanometres(), limits.most_vertical.nanometres() | VERTICAL);
            report.violation(Subject::Fixture(arm.fixture), found, limit);
        }
    }
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let Subject::Fixture(fixture) = finding.subject else { return String::new() };
    let way = if finding.limit & VERTICAL == 0 { "horizontally" } else { "vertically" };
    format!(
        "the vent of `{}` is {} away {way}, at most {} is allowed for a siphonic fixture",
        case.operands.network.fixtures.id[fixture.index()],
        case.length(finding.found),
        case.length(finding.limit & !VERTICAL)
    )
}
