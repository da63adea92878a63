//! The order of the drains: water only runs to a higher number, and what is upstream of a drain stands just before it.

use super::register::Element;
use crate::error::{Fault, FaultCode, Faults};
use crate::layout::Layout;

/// The ends of every drain, by position in the layout: where it begins, and the joint where it ends.
pub(super) struct Ends {
    pub(super) from: Vec<Option<Element>>,
    pub(super) to: Vec<Option<u32>>,
}

/// The drains in order, and how they hang together.
pub(super) struct DrainOrder {
    /// The position in the layout of each drain, in order.
    pub(super) drawn: Vec<u32>,
    /// For each drain in order the first drain upstream of it.
    pub(super) first: Vec<u32>,
    /// For each drain in order the number of the next; none at the sewer.
    pub(super) next: Vec<Option<u32>>,
    /// For each joint of the layout the number of the drain that leaves it.
    pub(super) leaving: Vec<Option<u32>>,
}

/// A list of lists in two arrays: for each joint the drains that end there, sorted by id.
struct Arrivals {
    start: Vec<u32>,
    list: Vec<u32>,
}

impl Arrivals {
    fn new(layout: &Layout, ends: &Ends) -> Self {
        let mut start = vec![0_u32; layout.joints.len() + 1];
        for joint in ends.to.iter().flatten() {
            start[*joint as usize + 1] += 1;
        }
        for index in 1..start.len() {
            start[index] += start[index - 1];
        }
        let mut list = vec![0; start.last().copied().unwrap_or(0) as usize];
        let mut filled = start.clone();
        for (drain, joint) in ends.to.iter().enumerate() {
            if let Some(joint) = joint {
                list[filled[*joint as usize] as usize] = drain as u32;
                filled[*joint as usize] += 1;
            }
        }
        let mut arrivals = Self { start, list };
        for joint in 0..layout.joints.len() {
            let range = arrivals.range(joint);
            if range.len() > 1 {
                arrivals.list[range].sort_unstable_by(|left, right| {
                    layout.drains[*left as usize].id.cmp(&layout.drains[*right as usize].id)
                });
            }
        }
        arrivals
    }

    fn range(&self, joint: usize) -> std::ops::Range<usize> {
        self.start[joint] as usize..self.start[joint + 1] as usize
    }
}

/// Orders the drains from the sewer connection upstream; reports cycles, ways that end and two ways down.
pub(super) fn order(layout: &Layout, ends: &Ends, sewer: Option<u32>, faults: &mut Faults) -> DrainOrder {
    let leaving = leaving(layout, ends, faults);
    let arrivals = Arrivals::new(layout, ends);
    let count = layout.drains.len();

    // Each drain before what is upstream of it; turned round, that is the order wanted.
    let mut drawn = Vec::with_capacity(count);
    let mut reached = vec![false; count];
    let mut waiting: Vec<u32> = Vec::new();
    if let Some(sewer) = sewer {
        waiting.extend(&arrivals.list[arrivals.range(sewer as usize)]);
    }
    while let Some(drain) = waiting.pop() {
        if std::mem::replace(&mut reached[drain as usize], true) {
            continue;
        }
        drawn.push(drain);
        if let Some(Element::Joint(joint)) = ends.from[drain as usize]
            && leaving[joint as usize] == Some(drain)
        {
            waiting.extend(&arrivals.list[arrivals.range(joint as usize)]);
        }
    }
    drawn.reverse();
    if drawn.len() < count {
        report_unreached(layout, ends, sewer, &leaving, &reached, faults);
    }

    let mut number = vec![None; count];
    for (index, drain) in drawn.iter().enumerate() {
        number[*drain as usize] = Some(index as u32);
    }
    let next: Vec<Option<u32>> = drawn
        .iter()
        .map(|drain| {
            let joint = ends.to[*drain as usize].filter(|joint| Some(*joint) != sewer)?;
            number[leaving[joint as usize]? as usize]
        })
        .collect();
    let mut size = vec![1_u32; drawn.len()];
    for (index, next) in next.iter().enumerate() {
        if let Some(next) = next {
            size[*next as usize] += size[index];
        }
    }
    let first = size.iter().enumerate().map(|(index, size)| index as u32 + 1 - size).collect();
    let leaving = leaving.iter().map(|drain| drain.and_then(|drain| number[drain as usize])).collect();
    DrainOrder { drawn, first, next, leaving }
}

/// For each joint the drain that leaves it.
fn leaving(layout: &Layout, ends: &Ends, faults: &mut Faults) -> Vec<Option<u32>> {
    let mut leaving: Vec<Option<u32>> = vec![None; layout.joints.len()];
    let mut fixture: Vec<Option<u32>> = vec![None; layout.fixtures.len()];
    for (index, from) in ends.from.iter().enumerate() {
        let (slot, word) = match from {
            Some(Element::Joint(joint)) => (&mut leaving[*joint as usize], "joint"),
            Some(Element::Fixture(number)) => (&mut fixture[*number as usize], "fixture"),
            _ => continue,
        };
        let drain = &layout.drains[index];
        match slot {
            None => *slot = Some(index as u32),
            Some(other) => {
                let other = &layout.drains[*other as usize].id;
                let message =
                    format!("the {word} `{}` has two ways down, by `{other}` and by `{}`", drain.from, drain.id);
                let fault = Fault::new(FaultCode::TwoWaysDown, format!("drains[{index}].from"), message);
                faults.push(fault.of(&drain.id).help("let one drain leave it, and others arrive"));
            }
        }
    }
    leaving
}

/// Says why some drains do not reach the sewer: once for each circle and once for each joint where the way ends.
fn report_unreached(
    layout: &Layout,
    ends: &Ends,
    sewer: Option<u32>,
    leaving: &[Option<u32>],
    reached: &[bool],
    faults: &mut Faults,
) {
    const UNSEEN: u32 = u32::MAX;
    let mut seen = vec![UNSEEN; reached.len()];
    let mut end_of: Vec<Vec<u32>> = Vec::new();
    let mut end_joint: Vec<(u32, usize)> = Vec::new();
    let mut slot_of_joint = vec![UNSEEN; layout.joints.len()];
    for start in 0..reached.len() {
        let mut drain = start as u32;
        while !reached[drain as usize] && seen[drain as usize] == UNSEEN {
            seen[drain as usize] = start as u32;
            let Some(joint) = ends.to[drain as usize].filter(|joint| Some(*joint) != sewer) else { break };
            let Some(onward) = leaving[joint as usize] else {
                let slot = &mut slot_of_joint[joint as usize];
                if *slot == UNSEEN {
                    *slot = end_of.len() as u32;
                    end_of.push(Vec::new());
                    end_joint.push((joint, drain as usize));
                }
                break;
            };
            if seen[onward as usize] == start as u32 && !reached[onward as usize] {
                report_cycle(layout, ends, leaving, onward, faults);
                break;
            }
            drain = onward;
        }
    }
    let stranded = strand(ends, leaving, reached, &slot_of_joint);
    for (drain, slot) in stranded.into_iter().enumerate() {
        if let (Some(Element::Fixture(fixture)), Some(fixtures)) = (ends.from[drain], end_of.get_mut(slot as usize)) {
            fixtures.push(fixture);
        }
    }
    for ((joint, drain), fixtures) in end_joint.into_iter().zip(end_of) {
        report_end(layout, joint, drain, &fixtures, faults);
    }
}

/// For each drain the end that its water comes to, `u32::MAX` when none; each drain is followed once.
fn strand(ends: &Ends, leaving: &[Option<u32>], reached: &[bool], slot_of_joint: &[u32]) -> Vec<u32> {
    const UNSEEN: u32 = u32::MAX - 1;
    const NOWHERE: u32 = u32::MAX;
    let mut end: Vec<u32> = reached.iter().map(|reached| if *reached { NOWHERE } else { UNSEEN }).collect();
    let mut path = Vec::new();
    for start in 0..reached.len() {
        let mut drain = start;
        path.clear();
        let found = loop {
            if end[drain] != UNSEEN {
                break end[drain];
            }
            // A drain that is met again on the same walk closes a circle, which was reported already.
            end[drain] = NOWHERE;
            path.push(drain);
            let Some(joint) = ends.to[drain] else { break NOWHERE };
            match leaving[joint as usize] {
                Some(onward) => drain = onward as usize,
                None => break slot_of_joint[joint as usize],
            }
        };
        for drain in &path {
            end[*drain] = found;
        }
    }
    end
}

fn report_cycle(layout: &Layout, ends: &Ends, leaving: &[Option<u32>], start: u32, faults: &mut Faults) {
    let mut members = Vec::new();
    let mut drain = start;
    loop {
        members.push(drain);
        match ends.to[drain as usize].and_then(|joint| leaving[joint as usize]) {
            Some(onward) if onward != start => drain = onward,
            _ => break,
        }
    }
    let first = members.iter().copied().min().unwrap_or(start);
    let names: Vec<String> =
        members.iter().take(6).map(|drain| format!("`{}`", layout.drains[*drain as usize].id)).collect();
    let more = if members.len() > 6 { format!(" and {} more", members.len() - 6) } else { String::new() };
    let message = format!("drains run in a circle: {}{more}", names.join(", "));
    let fault = Fault::new(FaultCode::Cycle, format!("drains[{first}]"), message);
    faults.push(fault.of(&layout.drains[first as usize].id).help("lead one of them toward the sewer connection"));
}

fn report_end(layout: &Layout, joint: u32, drain: usize, fixtures: &[u32], faults: &mut Faults) {
    let joint_id = &layout.joints[joint as usize].id;
    let names: Vec<String> =
        fixtures.iter().take(6).map(|fixture| format!("`{}`", layout.fixtures[*fixture as usize].id)).collect();
    let who = match fixtures.len() {
        0 => format!("the drain `{}`", layout.drains[drain].id),
        1 => format!("the fixture {}", names[0]),
        2..=6 => format!("the fixtures {}", names.join(", ")),
        count => format!("{count} fixtures ({} …)", names.join(", ")),
    };
    let verb = if fixtures.len() > 1 { "do" } else { "does" };
    let message = format!("{who} {verb} not reach the sewer: no drain leads on from the joint `{joint_id}`");
    let help = format!("add a drain from `{joint_id}` toward the sewer connection `{}`", layout.sewer.at);
    let fault = Fault::new(FaultCode::ReachesNoSewer, format!("drains[{drain}].to"), message);
    faults.push(fault.of(&layout.drains[drain].id).help(help));
}
