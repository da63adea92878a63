//! Stacks: lines of vertical pipe that pass through at least one storey, with their offsets.
//!
//! NPC 2015, Division A, 1.4.1.2., `stack`. How a line is followed through level offsets and how far below the floor above a
//! drain may hang and still pass the storey is our reading; the allowance is a parameter of the edition.

use super::Names;
use crate::edition::Edition;
use crate::loading::{Loads, refill};
use crate::network::{DrainId, LevelRow, Network};
use crate::quantity::{FixtureUnits, Length};

/// A stack, by its number.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub struct StackId(pub u32);

/// A soil or waste stack.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct Stack {
    /// Its uppermost pipe.
    pub top: DrainId,
    /// Its lowest pipe.
    pub foot: DrainId,
    /// How many storeys it passes through.
    pub storeys: u32,
    /// Whether a water closet drains into it.
    pub soil: bool,
}

/// A vertical run: pipes that follow one another straight down.
#[derive(Debug, Clone, Copy)]
struct Run {
    head: DrainId,
    last: DrainId,
    top: Length,
    foot: Length,
    /// The run above a level stretch that leads to this one, with the length of the stretch.
    above: Option<(usize, Option<Length>)>,
    /// The last pipe of that stretch.
    stretch: Option<DrainId>,
    group: usize,
}

/// Runs that make one line.
#[derive(Debug, Clone, Copy)]
struct Group {
    top: Length,
    storeys: u32,
    head: DrainId,
    last: DrainId,
}

/// Columns that are only needed while stacks are looked for.
#[derive(Debug, Clone, Default)]
pub(super) struct Scratch {
    runs: Vec<Run>,
    groups: Vec<Group>,
    stack_of_group: Vec<Option<StackId>>,
    floors: Vec<Length>,
    /// The run of a vertical pipe; of a level pipe, the run from whose foot it comes.
    run: Vec<Option<u32>>,
    /// The length of the level stretch since that foot.
    stretch: Vec<Option<Length>>,
    /// The arriving pipe that the line follows.
    pub(super) line: Vec<Option<DrainId>>,
}

impl Names {
    pub(super) fn find_stacks(&mut self, network: &Network, edition: &Edition, loads: &Loads) {
        let count = network.drains.len();
        refill(&mut self.stack_of, count, None);
        refill(&mut self.long_offset, count, false);
        self.stacks.clear();
        self.scratch.follow_lines(network, loads);
        self.scratch.group_runs(network, edition, loads);
        let scratch = &mut self.scratch;
        scratch.stack_of_group.clear();
        for group in &scratch.groups {
            let stack = (group.storeys > 0).then(|| {
                let soil = loads.water_closets[group.last.index()] > 0;
                self.stacks.push(Stack { top: group.head, foot: group.last, storeys: group.storeys, soil });
                StackId(self.stacks.len() as u32 - 1)
            });
            scratch.stack_of_group.push(stack);
        }
        for index in 0..count {
            if network.drains.vertical[index]
                && let Some(run) = scratch.run[index]
            {
                self.stack_of[index] = scratch.stack_of_group[scratch.runs[run as usize].group];
            }
        }
        self.mark_offsets(network, edition);
    }

    /// The level stretches between two runs of one stack.
    fn mark_offsets(&mut self, network: &Network, edition: &Edition) {
        for run in &self.scratch.runs {
            let (Some((above, length)), Some(last)) = (run.above, run.stretch) else { continue };
            let stack = self.scratch.stack_of_group[run.group];
            if self.scratch.runs[above].group != run.group || stack.is_none() {
                continue;
            }
            // An offset of unknown length is sized as a long one.
            let long = length.is_none_or(|length| length >= edition.rules.stack_offset.value);
            let mut pipe = Some(last);
            while let Some(at) = pipe.filter(|at| !network.drains.vertical[at.index()]) {
                self.stack_of[at.index()] = stack;
                self.long_offset[at.index()] = long;
                pipe = self.scratch.line[at.index()];
            }
        }
    }
}

impl Scratch {
    /// Follows the water down every vertical run and along the level stretch at its foot.
    fn follow_lines(&mut self, network: &Network, loads: &Loads) {
        let drains = &network.drains;
        let count = drains.len();
        self.runs.clear();
        refill(&mut self.run, count, None);
        refill(&mut self.stretch, count, None);
        refill(&mut self.line, count, None);
        for index in 0..count {
            let drain = DrainId::new(index);
            let mut line: Option<(bool, Length, FixtureUnits, DrainId)> = None;
            for arriving in drains.arriving(drain) {
                let Some(run) = self.run[arriving.index()] else { continue };
                // Straight on before round a bend, then the highest line, then the one with the most load.
                let load = loads.load[arriving.index()];
                let rank = (drains.vertical[arriving.index()], self.runs[run as usize].top, load, arriving);
                if line.is_none_or(|best| rank > best) {
                    line = Some(rank);
                }
            }
            let line = line.map(|(vertical, _, _, arriving)| (vertical, arriving));
            self.line[index] = line.map(|(_, arriving)| arriving);
            if drains.vertical[index] {
                self.vertical(network, drain, line);
            } else if let Some((vertical, arriving)) = line {
                self.run[index] = self.run[arriving.index()];
                let before = if vertical { Some(Length::ZERO) } else { self.stretch[arriving.index()] };
                self.stretch[index] = before.zip(drains.length[index]).map(|(before, length)| before + length);
            }
        }
    }

    fn vertical(&mut self, network: &Network, drain: DrainId, line: Option<(bool, DrainId)>) {
        let drains = &network.drains;
        let index = drain.index();
        let above = line.map(|(vertical, arriving)| (vertical, arriving, self.run[arriving.index()]));
        if let Some((true, _, Some(run))) = above {
            let run_index = run as usize;
            self.runs[run_index].last = drain;
            self.runs[run_index].foot = drains.foot[index];
            self.run[index] = Some(run);
            return;
        }
        let (source, stretch) = match above {
            Some((false, arriving, Some(run))) => {
                (Some((run as usize, self.stretch[arriving.index()])), Some(arriving))
            }
            _ => (None, None),
        };
        self.run[index] = Some(self.runs.len() as u32);
        self.runs.push(Run {
            head: drain,
            last: drain,
            top: drains.top[index],
            foot: drains.foot[index],
            above: source,
            stretch,
            group: 0,
        });
    }

    /// Puts the runs of one line together: two that each pass a storey, or two that pass one only together, by a short offset or by
    /// one that nothing else drains into.
    fn group_runs(&mut self, network: &Network, edition: &Edition, loads: &Loads) {
        let allowance = edition.rules.storey_allowance.value;
        self.floors.clear();
        self.floors.extend(network.levels.iter().map(|LevelRow { floor, .. }| *floor));
        self.floors.dedup();
        self.groups.clear();
        for index in 0..self.runs.len() {
            let run = self.runs[index];
            let own = storeys_passed(&self.floors, allowance, run.top, run.foot);
            let group = run.above.and_then(|(above, length)| {
                let group = self.runs[above].group;
                let Group { top, storeys, .. } = self.groups[group];
                let together = storeys_passed(&self.floors, allowance, top, run.foot);
                let short = length.is_some_and(|length| length < edition.rules.stack_offset.value);
                let traps = |pipe: DrainId| loads.traps[pipe.index()];
                let alone = run.stretch.is_some_and(|last| traps(last) == traps(self.runs[above].last));
                let joined = (storeys > 0 && own > 0) || ((short || alone) && together > storeys + own);
                joined.then_some((group, together.max(storeys + own)))
            });
            self.runs[index].group = match group {
                Some((group, storeys)) => {
                    self.groups[group].storeys = storeys;
                    self.groups[group].last = run.last;
                    group
                }
                None => {
                    self.groups.push(Group { top: run.top, storeys: own, head: run.head, last: run.last });
                    self.groups.len() - 1
                }
            };
        }
    }
}

/// How many storeys lie between `top` and `foot`, when a drain may hang `allowance` below the floor above.
fn storeys_passed(floors: &[Length], allowance: Length, top: Length, foot: Length) -> u32 {
    let reached = floors.partition_point(|floor| *floor <= top + allowance);
    let lowest = floors.partition_point(|floor| *floor < foot);
    u32::try_from(reached.saturating_sub(1).saturating_sub(lowest)).unwrap_or(0)
}

#[cfg(test)]
mod tests {
    use super::*;

    fn metres(values: &[i64]) -> Vec<Length> {
        values.iter().map(|value| Length::from_millimetres(value * 100)).collect()
    }

    #[test]
    fn counts_the_storeys_between_top_and_foot() {
        let floors = metres(&[-27, 0, 28, 56]);
        let allowance = Length::from_millimetres(450);
        let passed = |top: i64, foot: i64| {
            let length = |value: i64| Length::from_millimetres(value * 100);
            storeys_passed(&floors, allowance, length(top), length(foot))
        };
        assert_eq!(passed(5, -31), 1, "from a sink on the main floor to below the basement slab");
        assert_eq!(passed(25, -31), 2, "hung 300 mm under the upper floor, to below the basement slab");
        assert_eq!(passed(25, -3), 1, "hung under the upper floor, to under the main floor");
        assert_eq!(passed(-5, -31), 0, "hung 500 mm under the main floor is not at its ceiling line");
        assert_eq!(passed(-4, -31), 1);
        assert_eq!(passed(4, -2), 0, "a drop within the floor");
    }
}
