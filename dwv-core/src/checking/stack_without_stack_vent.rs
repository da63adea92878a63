//! A stack whose upper end does not end in a stack vent (NPC 2015, 2.5.4.1.).

use super::{Case, Check, Finding, Report, Subject};

pub(super) const CHECK: Check = Check {
    name: "stack-without-stack-vent",
    finds: "a stack whose upper end does not go on as a stack vent",
    matters: "nothing relieves the air that falling waste drags along",
    remedy: "carry the top of the stack on as a vent",
    citation: |edition| edition.rules.stack_vent_required.citation,
    run,
    words,
};

fn run(case: &Case<'_>, report: &mut Report<'_>) {
    for stack in &case.operands.names.stacks {
        if case.operands.network.drains.vent[stack.top.index()].is_none() {
            report.violation(Subject::Drain(stack.top), 0, 0);
        }
    }
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let Subject::Drain(drain) = finding.subject else { return String::new() };
    let drains = &case.operands.network.drains;
    format!(
        "the stack that begins with `{}` has no stack vent: no vent leaves `{}`",
        drains.id[drain.index()],
        drains.from[drain.index()]
    )
}
