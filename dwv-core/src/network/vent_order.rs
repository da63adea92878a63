//! The order of the vents: air on its way out only runs to a higher number.

use super::VentEnd;
use super::register::Element;
use crate::error::{Fault, FaultCode, Faults};
use crate::layout::Layout;

/// The ends of every vent, by position in the layout: the joint where it begins, and where it ends.
pub(super) struct VentEnds {
    pub(super) from: Vec<Option<u32>>,
    pub(super) to: Vec<Option<Element>>,
}

/// The vents in order, and how they hang together.
pub(super) struct VentOrder {
    pub(super) drawn: Vec<u32>,
    pub(super) next: Vec<Option<u32>>,
    pub(super) first: Vec<u32>,
    pub(super) end: Vec<VentEnd>,
    /// For each joint of the layout the number of the vent that leaves it.
    pub(super) leaving: Vec<Option<u32>>,
}

/// Orders the vents from open air and valves inward; reports circles, vents without air and two ways up.
pub(super) fn order(layout: &Layout, ends: &VentEnds, faults: &mut Faults) -> VentOrder {
    let count = layout.vents.len();
    let leaving = leaving(layout, ends, faults);
    let mut arriving: Vec<(u32, u32)> = Vec::with_capacity(count);
    let mut outlets: Vec<u32> = Vec::new();
    for (vent, to) in ends.to.iter().enumerate() {
        match to {
            Some(Element::Joint(joint)) => arriving.push((*joint, vent as u32)),
            Some(Element::Terminal(_) | Element::Valve(_)) => outlets.push(vent as u32),
            _ => {}
        }
    }
    let id = |vent: u32| &layout.vents[vent as usize].id;
    arriving.sort_unstable_by(|left, right| left.0.cmp(&right.0).then_with(|| id(left.1).cmp(id(right.1))));
    outlets.sort_unstable_by(|left, right| id(*left).cmp(id(*right)));

    let mut drawn = Vec::with_capacity(count);
    let mut end = Vec::with_capacity(count);
    let mut reached = vec![false; count];
    let mut waiting: Vec<(u32, VentEnd)> = Vec::new();
    for outlet in outlets {
        waiting.push((
            outlet,
            match ends.to[outlet as usize] {
                Some(Element::Valve(valve)) => VentEnd::Valve(valve),
                Some(Element::Terminal(terminal)) => VentEnd::Terminal(terminal),
                _ => continue,
            },
        ));
    }
    while let Some((vent, air)) = waiting.pop() {
        if std::mem::replace(&mut reached[vent as usize], true) {
            continue;
        }
        drawn.push(vent);
        end.push(air);
        if let Some(joint) = ends.from[vent as usize]
            && leaving[joint as usize] == Some(vent)
        {
            let start = arriving.partition_point(|(to, _)| *to < joint);
            waiting.extend(arriving[start..].iter().take_while(|(to, _)| *to == joint).map(|(_, vent)| (*vent, air)));
        }
    }
    drawn.reverse();
    end.reverse();
    report_unreached(layout, ends, &leaving, &reached, faults);

    let mut number = vec![None; count];
    for (index, vent) in drawn.iter().enumerate() {
        number[*vent as usize] = Some(index as u32);
    }
    let next: Vec<Option<u32>> = drawn
        .iter()
        .map(|vent| match ends.to[*vent as usize] {
            Some(Element::Joint(joint)) => number[leaving[joint as usize]? as usize],
            _ => None,
        })
        .collect();
    let mut size = vec![1_u32; drawn.len()];
    for (index, next) in next.iter().enumerate() {
        if let Some(next) = next {
            size[*next as usize] += size[index];
        }
    }
    let first = size.iter().enumerate().map(|(index, size)| index as u32 + 1 - size).collect();
    let leaving = leaving.iter().map(|vent| vent.and_then(|vent| number[vent as usize])).collect();
    VentOrder { drawn, next, first, end, leaving }
}

fn leaving(layout: &Layout, ends: &VentEnds, faults: &mut Faults) -> Vec<Option<u32>> {
    let mut leaving: Vec<Option<u32>> = vec![None; layout.joints.len()];
    for (index, from) in ends.from.iter().enumerate() {
        let Some(joint) = from else { continue };
        let vent = &layout.vents[index];
        match &mut leaving[*joint as usize] {
            slot @ None => *slot = Some(index as u32),
            Some(other) => {
                let other = &layout.vents[*other as usize].id;
                let message = format!("two vents leave the joint `{}`: `{other}` and `{}`", vent.from, vent.id);
                let fault = Fault::new(FaultCode::TwoWaysUp, format!("vents[{index}].from"), message);
                faults.push(fault.of(&vent.id).help("let one vent leave it, and branch from a joint further on"));
            }
        }
    }
    leaving
}

/// Says why some vents reach no air: once for each circle and once for each joint where the way ends.
fn report_unreached(layout: &Layout, ends: &VentEnds, leaving: &[Option<u32>], reached: &[bool], faults: &mut Faults) {
    const UNSEEN: u32 = u32::MAX;
    let mut seen = vec![UNSEEN; reached.len()];
    let mut reported = vec![false; layout.joints.len()];
    for start in 0..reached.len() {
        let mut vent = start;
        while !reached[vent] && seen[vent] == UNSEEN {
            seen[vent] = start as u32;
            let Some(Element::Joint(joint)) = ends.to[vent] else { break };
            let Some(onward) = leaving[joint as usize] else {
                if !std::mem::replace(&mut reported[joint as usize], true) {
                    let id = &layout.vents[vent].id;
                    let joint = &layout.joints[joint as usize].id;
                    let message = format!("the vent `{id}` has no air: no vent leads on from the joint `{joint}`");
                    let help = "lead it on to a terminal or an air admittance valve";
                    let fault = Fault::new(FaultCode::VentWithoutAir, format!("vents[{vent}].to"), message);
                    faults.push(fault.of(id).help(help));
                }
                break;
            };
            if seen[onward as usize] == start as u32 {
                let id = &layout.vents[onward as usize].id;
                let message = format!("vents run in a circle through `{id}` and reach no air");
                let fault = Fault::new(FaultCode::Cycle, format!("vents[{onward}]"), message);
                faults.push(fault.of(id).help("lead one of them to a terminal or an air admittance valve"));
                break;
            }
            vent = onward as usize;
        }
    }
}
