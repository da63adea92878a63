//! Levels, fixtures, joints and drains, and what can be stated of them.

use super::piece::Piece;
use super::stated::Stated;
use crate::layout::{Drain, Fixture, Id, Joint, Level, Runs, StatedName};
use crate::quantity::{FixtureUnits, FlowRate, Measure, PipeSize, Slope, Written};

impl Level {
    /// A level with the height of its finished floor.
    pub fn new(id: impl Into<Id>, floor: impl Stated<Measure>) -> Piece<Self> {
        let level = Self { id: id.into(), floor: Measure::Number(0.0) };
        Piece::from(level).read("floor", floor, |level, floor| level.floor = floor)
    }
}

impl Fixture {
    /// A fixture of a kind of the edition's table, or `custom`, on a level.
    pub fn new(id: impl Into<Id>, kind: impl Into<Id>, level: impl Into<Id>) -> Piece<Self> {
        Piece::from(Self {
            id: id.into(),
            kind: kind.into(),
            level: level.into(),
            at: None,
            height: None,
            trap: None,
            load: None,
            continuous_flow: None,
            semi_continuous_flow: None,
            group: None,
            outlet_length: None,
            future: false,
        })
    }
}

impl Piece<Fixture> {
    /// Where its trap is on the plan.
    pub fn at(self, across: impl Stated<Measure>, along: impl Stated<Measure>) -> Self {
        self.read_position(across, along, |fixture, at| fixture.at = Some(at))
    }

    /// The height of the trap weir above the floor.
    pub fn height(self, height: impl Stated<Measure>) -> Self {
        self.read("height", height, |fixture, height| fixture.height = Some(height))
    }

    /// The size of the trap.
    pub fn trap(self, size: impl Stated<PipeSize>) -> Self {
        self.read("trap", size, |fixture, size| fixture.trap = Some(size))
    }

    /// The load in fixture units.
    pub fn load(self, load: impl Stated<FixtureUnits>) -> Self {
        self.read("load", load, |fixture, load| fixture.load = Some(load))
    }

    /// The flow of equipment that runs on and on.
    pub fn continuous_flow(self, flow: impl Stated<Written<FlowRate>>) -> Self {
        self.read("continuous_flow", flow, |fixture, flow| fixture.continuous_flow = Some(flow))
    }

    /// The flow of equipment that runs now and then for a while.
    pub fn semi_continuous_flow(self, flow: impl Stated<Written<FlowRate>>) -> Self {
        self.read("semi_continuous_flow", flow, |fixture, flow| fixture.semi_continuous_flow = Some(flow))
    }

    /// The bathroom group that it belongs to.
    pub fn group(self, group: impl Into<Id>) -> Self {
        self.with(|fixture| fixture.group = Some(group.into()))
    }

    /// The developed length between the outlet and the trap.
    pub fn outlet_length(self, length: impl Stated<Measure>) -> Self {
        self.read("outlet_length", length, |fixture, length| fixture.outlet_length = Some(length))
    }

    /// Only provided for; it counts all the same.
    pub fn future(self) -> Self {
        self.with(|fixture| fixture.future = true)
    }
}

impl Joint {
    /// A joint on a level.
    pub fn new(id: impl Into<Id>, level: impl Into<Id>) -> Piece<Self> {
        Piece::from(Self { id: id.into(), level: level.into(), at: None, height: None })
    }
}

impl Piece<Joint> {
    /// Where it is on the plan.
    pub fn at(self, across: impl Stated<Measure>, along: impl Stated<Measure>) -> Self {
        self.read_position(across, along, |joint, at| joint.at = Some(at))
    }

    /// Its height above the floor of the level.
    pub fn height(self, height: impl Stated<Measure>) -> Self {
        self.read("height", height, |joint, height| joint.height = Some(height))
    }
}

impl Drain {
    /// A nominally level pipe.
    pub fn level(id: impl Into<Id>, from: impl Into<Id>, to: impl Into<Id>) -> Piece<Self> {
        Self::running(Runs::Level, id.into(), from.into(), to.into())
    }

    /// A pipe straight down, or within 45° of it.
    pub fn vertical(id: impl Into<Id>, from: impl Into<Id>, to: impl Into<Id>) -> Piece<Self> {
        Self::running(Runs::Vertical, id.into(), from.into(), to.into())
    }

    /// A pipe at a stated drop or slope.
    pub fn sloped(id: impl Into<Id>, from: impl Into<Id>, to: impl Into<Id>) -> Piece<Self> {
        Self::running(Runs::Sloped, id.into(), from.into(), to.into())
    }

    fn running(runs: Runs, id: Id, from: Id, to: Id) -> Piece<Self> {
        Piece::from(Self {
            id,
            from,
            to,
            runs,
            length: None,
            drop: None,
            slope: None,
            size: None,
            name: None,
            underground: false,
            outside: false,
            turns: None,
        })
    }
}

impl Piece<Drain> {
    /// Its developed length.
    pub fn length(self, length: impl Stated<Measure>) -> Self {
        self.read("length", length, |drain, length| drain.length = Some(length))
    }

    /// How far its lower end is below its upper end.
    pub fn drop(self, drop: impl Stated<Measure>) -> Self {
        self.read("drop", drop, |drain, drop| drain.drop = Some(drop))
    }

    /// Its slope.
    pub fn slope(self, slope: impl Stated<Written<Slope>>) -> Self {
        self.read("slope", slope, |drain, slope| drain.slope = Some(slope))
    }

    /// Its size, where it is fixed already.
    pub fn size(self, size: impl Stated<PipeSize>) -> Self {
        self.read("size", size, |drain, size| drain.size = Some(size))
    }

    /// Its name in the code's terms.
    pub fn named(self, name: StatedName) -> Self {
        self.with(|drain| drain.name = Some(name))
    }

    /// In or under the ground.
    pub fn underground(self) -> Self {
        self.with(|drain| drain.underground = true)
    }

    /// Outside the building's wall.
    pub fn outside(self) -> Self {
        self.with(|drain| drain.outside = true)
    }

    /// The sum of its turns in degrees.
    pub fn turns(self, degrees: u16) -> Self {
        self.with(|drain| drain.turns = Some(degrees))
    }
}
