//! Reasons in words.

use crate::network::Network;
use crate::quantity::{FixtureUnits, Length, PipeSize};
use crate::sizing::{Reason, Rule};

/// The stable name of a rule.
#[must_use]
pub fn rule_name(rule: Rule) -> &'static str {
    match rule {
        Rule::Trap => "trap",
        Rule::BranchTable => "branch-table",
        Rule::StackTotal => "stack-total",
        Rule::StackOneStorey => "stack-one-storey",
        Rule::BuildingDrainTable => "building-drain-table",
        Rule::WaterCloset => "water-closet",
        Rule::ThirdWaterCloset => "third-water-closet",
        Rule::StackWaterClosets => "stack-water-closets",
        Rule::SewerLeast => "sewer-least",
        Rule::UndergroundLeast => "underground-least",
        Rule::Upstream => "upstream",
        Rule::ConnectedVent => "connected-vent",
        Rule::WetVentTable => "wet-vent-table",
        Rule::VentByTrap => "vent-by-trap",
        Rule::VentLength => "vent-length",
        Rule::VentLengthStandIn => "vent-length-stand-in",
        Rule::StackVentTable => "stack-vent-table",
        Rule::HalfStack => "half-stack",
        Rule::JoinedVent => "joined-vent",
        Rule::OneLargeVent => "one-large-vent",
        Rule::TallWetVent => "tall-wet-vent",
        Rule::Frost => "frost",
        Rule::AtTerminal => "at-terminal",
        Rule::AsDrawn => "as-drawn",
    }
}

/// What a reason says, without the size that it asks for: `branch table, 6 FU`.
#[must_use]
pub fn says(network: &Network, reason: &Reason) -> String {
    let load = || FixtureUnits::from_thousandths(u64::try_from(reason.operand).unwrap_or(0));
    let size = || usize::try_from(reason.operand).ok().and_then(PipeSize::from_index).map_or("?", PipeSize::text);
    let length = || Length::from_millimetres(i64::from(reason.other)).rounded(network.length_unit);
    let count = |word: &str| match reason.operand {
        1 => format!("1 {word}"),
        many => format!("{many} {word}s"),
    };
    match reason.rule {
        Rule::Trap => format!("trap of {} in", size()),
        Rule::BranchTable => format!("branch table, {} FU", load()),
        Rule::StackTotal => format!("stack table, {} FU in all", load()),
        Rule::StackOneStorey => format!("stack table, {} FU from one storey", load()),
        Rule::BuildingDrainTable => format!("building drain table, {} FU", load()),
        Rule::WaterCloset => format!("serves {}", count("water closet")),
        Rule::ThirdWaterCloset => format!("from the third water closet on, serves {}", reason.operand),
        Rule::StackWaterClosets => format!("stack of more than six water closets, serves {}", reason.operand),
        Rule::SewerLeast => "least size of a building sewer".to_owned(),
        Rule::UndergroundLeast => "building drain underground".to_owned(),
        Rule::Upstream => format!("drain `{}` empties into it", drain(network, reason.other)),
        Rule::ConnectedVent => format!("vent `{}` is connected to it", vent(network, reason.other)),
        Rule::WetVentTable => format!("wet vent table, {} FU", load()),
        Rule::VentByTrap => format!("vent of a {} in trap", size()),
        Rule::VentLength => format!("vent table, {} FU over {}", load(), length()),
        Rule::VentLengthStandIn => format!("stack vent table as a stand-in, {} FU over {}", load(), length()),
        Rule::StackVentTable => format!("stack vent table, {} FU over {}", load(), length()),
        Rule::HalfStack => format!("half of a {} in stack", size()),
        Rule::JoinedVent => format!("vent `{}` joins it", vent(network, reason.other)),
        Rule::OneLargeVent => "the one large vent of the building drain".to_owned(),
        Rule::TallWetVent => format!("wet vent through {} keeps its size", count("storey")),
        Rule::Frost => format!("frost, one size larger than {} in", size()),
        Rule::AtTerminal => format!("vent `{}` ends here", vent(network, reason.other)),
        Rule::AsDrawn => "as drawn".to_owned(),
    }
}

fn drain(network: &Network, index: u32) -> &str {
    network.drains.id.get(index as usize).map_or("?", |id| id.as_str())
}

fn vent(network: &Network, index: u32) -> &str {
    network.vents.id.get(index as usize).map_or("?", |id| id.as_str())
}
