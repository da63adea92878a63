//! Vents, where they end, cleanouts and the sewer connection, and what can be stated of them.

use super::piece::Piece;
use super::stated::Stated;
use crate::layout::{Cleanout, Grounds, Id, Sewer, StatedName, Terminal, Through, Valve, Vent};
use crate::quantity::{Measure, PipeSize};

impl Vent {
    /// A vent, drawn toward the open air.
    pub fn new(id: impl Into<Id>, from: impl Into<Id>, to: impl Into<Id>) -> Piece<Self> {
        Piece::from(Self { id: id.into(), from: from.into(), to: to.into(), length: None, size: None, name: None })
    }
}

impl Piece<Vent> {
    /// Its developed length.
    pub fn length(self, length: impl Stated<Measure>) -> Self {
        self.read("length", length, |vent, length| vent.length = Some(length))
    }

    /// Its size, where it is fixed already.
    pub fn size(self, size: impl Stated<PipeSize>) -> Self {
        self.read("size", size, |vent, size| vent.size = Some(size))
    }

    /// Its name in the code's terms.
    pub fn named(self, name: StatedName) -> Self {
        self.with(|vent| vent.name = Some(name))
    }
}

impl Terminal {
    /// A vent terminal through the roof.
    pub fn roof(id: impl Into<Id>) -> Piece<Self> {
        Self::through(Through::Roof, id.into())
    }

    /// A vent terminal through an outside wall.
    pub fn wall(id: impl Into<Id>) -> Piece<Self> {
        Self::through(Through::Wall, id.into())
    }

    fn through(through: Through, id: Id) -> Piece<Self> {
        Piece::from(Self { id, through, level: None, at: None, height: None, above: None })
    }
}

impl Piece<Terminal> {
    /// The level that its place is measured from.
    pub fn level(self, level: impl Into<Id>) -> Self {
        self.with(|terminal| terminal.level = Some(level.into()))
    }

    /// Where it is on the plan.
    pub fn at(self, across: impl Stated<Measure>, along: impl Stated<Measure>) -> Self {
        self.read_position(across, along, |terminal, at| terminal.at = Some(at))
    }

    /// Its height above the floor of its level.
    pub fn height(self, height: impl Stated<Measure>) -> Self {
        self.read("height", height, |terminal, height| terminal.height = Some(height))
    }

    /// How far it ends above the roof or, through a wall, above the ground.
    pub fn above(self, above: impl Stated<Measure>) -> Self {
        self.read("above", above, |terminal, above| terminal.above = Some(above))
    }
}

impl Valve {
    /// An air admittance valve.
    pub fn new(id: impl Into<Id>) -> Piece<Self> {
        Piece::from(Self { id: id.into(), grounds: None, level: None, at: None, height: None })
    }
}

impl Piece<Valve> {
    /// Why it is permitted.
    pub fn grounds(self, grounds: Grounds) -> Self {
        self.with(|valve| valve.grounds = Some(grounds))
    }

    /// The level that its place is measured from.
    pub fn level(self, level: impl Into<Id>) -> Self {
        self.with(|valve| valve.level = Some(level.into()))
    }

    /// Where it is on the plan.
    pub fn at(self, across: impl Stated<Measure>, along: impl Stated<Measure>) -> Self {
        self.read_position(across, along, |valve, at| valve.at = Some(at))
    }

    /// Its height above the floor of its level.
    pub fn height(self, height: impl Stated<Measure>) -> Self {
        self.read("height", height, |valve, height| valve.height = Some(height))
    }
}

impl Cleanout {
    /// A cleanout at a joint.
    pub fn new(id: impl Into<Id>, at: impl Into<Id>) -> Piece<Self> {
        Piece::from(Self { id: id.into(), at: at.into() })
    }
}

impl Sewer {
    /// The connection to the public sewer at a joint.
    pub fn new(at: impl Into<Id>) -> Piece<Self> {
        Piece::from(Self { at: at.into(), invert: None })
    }
}

impl Piece<Sewer> {
    /// The invert of the connection.
    pub fn invert(self, invert: impl Stated<Measure>) -> Self {
        self.read("invert", invert, |sewer, invert| sewer.invert = Some(invert))
    }
}
