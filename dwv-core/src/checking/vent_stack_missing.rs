//! A stack of many storeys without a vent stack (NPC 2015, 2.5.4.2.).

use super::{Case, Check, Finding, Report, Subject};
use crate::naming::{Stack, VentName};

pub(super) const CHECK: Check = Check {
    name: "vent-stack-missing",
    finds: "a stack that drains fixtures of more than four storeys and has no vent stack",
    matters: "pressure builds at the foot and blows the lowest traps",
    remedy: "add a vent stack from the foot of the stack",
    citation: |edition| edition.rules.vent_stack_required.citation,
    run,
    words,
};

/// A stack that is itself a wet vent is excepted.
fn run(case: &Case<'_>, report: &mut Report<'_>) {
    let operands = &case.operands;
    let names = operands.names;
    let most = operands.edition.rules.vent_stack_required.value;
    for (number, stack) in names.stacks.iter().enumerate() {
        // A stack cannot take more storeys than lie between its highest and its lowest fixture: most need no count.
        let storeys = if stack.storeys + 1 > most { storeys_draining(case, *stack) } else { 0 };
        if storeys <= most || names.wet[stack.top.index()] {
            continue;
        }
        let has_vent_stack = names
            .vent
            .iter()
            .any(|role| role.name == VentName::VentStack && role.stack.is_some_and(|at| at.0 as usize == number));
        if !has_vent_stack {
            report.violation(Subject::Drain(stack.foot), i64::from(storeys), i64::from(most));
        }
    }
}

/// From how many storeys fixtures drain into a stack.
fn storeys_draining(case: &Case<'_>, stack: Stack) -> u32 {
    let network = case.operands.network;
    let mut seen = [false; 256];
    for index in network.drains.upstream(stack.foot) {
        if let Some(fixture) = network.drains.fixture[index] {
            seen[usize::from(network.fixtures.storey[fixture.index()].0)] = true;
        }
    }
    seen.iter().map(|seen| u32::from(*seen)).sum()
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let Subject::Drain(drain) = finding.subject else { return String::new() };
    format!(
        "the stack that ends with `{}` drains {} storeys and has no vent stack, which is needed above {}",
        case.operands.network.drains.id[drain.index()],
        finding.found,
        finding.limit
    )
}
