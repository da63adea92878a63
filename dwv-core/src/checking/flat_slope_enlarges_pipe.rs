//! A stated slope that makes a building drain or sewer larger (NPC 2015, Table 2.4.10.6.C).

use super::{Case, Check, Finding, Report, Severity, Subject};
use crate::network::DrainId;
use crate::quantity::PipeSize;
use crate::sizing::{Rule, building_drain_size_at_least_slope};

pub(super) const CHECK: Check = Check {
    name: "flat-slope-enlarges-pipe",
    finds: "a building drain or sewer that is larger because its stated slope is flat",
    matters: "a smaller pipe would do at the slope that the code asks of it",
    remedy: "give it more fall, or keep the larger pipe",
    citation: |edition| edition.rules.least_slope_large.citation,
    run,
    words,
};

fn run(case: &Case<'_>, report: &mut Report<'_>) {
    let drains = &case.operands.network.drains;
    for index in (0..drains.len()).filter(|index| drains.slope[*index].is_some()) {
        let size = case.sizes.drain[index];
        // Only where nothing but the table asks for the size.
        let mut asks = case.sizes.drain_reasons.of(index).iter().filter(|reason| reason.asks == size);
        let grown = asks.all(|reason| reason.rule == Rule::BuildingDrainTable);
        let least = building_drain_size_at_least_slope(&case.operands, index);
        if grown && let Some(least) = least.filter(|least| *least < size) {
            report.add(
                Severity::Caution,
                Subject::Drain(DrainId::new(index)),
                size.index() as i64,
                least.index() as i64,
            );
        }
    }
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let Subject::Drain(drain) = finding.subject else { return String::new() };
    let size = |index: i64| usize::try_from(index).ok().and_then(PipeSize::from_index).map_or("?", PipeSize::text);
    format!(
        "the drain `{}` is {} in because of its slope; at the least slope for its size {} in would take the load",
        case.operands.network.drains.id[drain.index()],
        size(finding.found),
        size(finding.limit)
    )
}
