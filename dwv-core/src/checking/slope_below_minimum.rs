//! A drain that is flatter than allowed (NPC 2015, 2.4.8.1.).

use super::{Case, Check, Finding, Report, Subject};
use crate::network::DrainId;
use crate::quantity::SlopeNotation;

pub(super) const CHECK: Check = Check {
    name: "slope-below-minimum",
    finds: "a drain whose stated slope is less than the edition allows for its size",
    matters: "solids settle and the drain blocks",
    remedy: "give it more fall, or take a size that may be as flat",
    citation: |edition| edition.rules.least_slope_small.citation,
    run,
    words,
};

fn run(case: &Case<'_>, report: &mut Report<'_>) {
    let drains = &case.operands.network.drains;
    for index in 0..drains.len() {
        let Some(slope) = drains.slope[index].filter(|_| !drains.vertical[index]) else { continue };
        let least = case.operands.edition.least_slope(case.sizes.drain[index]).value;
        if slope < least {
            report.violation(Subject::Drain(DrainId::new(index)), i64::from(least.run()), i64::from(least.rise()));
        }
    }
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let Subject::Drain(drain) = finding.subject else { return String::new() };
    let drains = &case.operands.network.drains;
    let stated = drains.slope[drain.index()].map(|slope| {
        let notation = drains.slope_notation[drain.index()].unwrap_or(SlopeNotation::Percent);
        slope.in_notation(notation).to_string()
    });
    format!(
        "the drain `{}` slopes {}, at least {}:{} is needed for {} in",
        drains.id[drain.index()],
        stated.unwrap_or_default(),
        finding.limit,
        finding.found,
        case.sizes.drain[drain.index()]
    )
}
