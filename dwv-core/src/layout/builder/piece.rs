//! Elements of a drawing, made piece by piece.

use super::stated::Stated;
use super::{LayoutBuilder, unreadable};
use crate::layout::{Cleanout, Drain, Fixture, Joint, Level, Sewer, Terminal, Valve, Vent};
use crate::quantity::{Measure, QuantityError};

/// An element being drawn. What cannot be read is kept and reported when the layout is built.
#[derive(Debug, Clone)]
#[must_use = "an element counts when it is added to a layout"]
pub struct Piece<T> {
    element: T,
    wrong: Vec<(&'static str, QuantityError)>,
}

impl<T> From<T> for Piece<T> {
    fn from(element: T) -> Self {
        Self { element, wrong: Vec::new() }
    }
}

impl<T> Piece<T> {
    pub(super) fn with(mut self, set: impl FnOnce(&mut T)) -> Self {
        set(&mut self.element);
        self
    }

    pub(super) fn read<Q>(mut self, key: &'static str, stated: impl Stated<Q>, set: impl FnOnce(&mut T, Q)) -> Self {
        match stated.read() {
            Ok(quantity) => set(&mut self.element, quantity),
            Err(error) => self.wrong.push((key, error)),
        }
        self
    }

    /// Reads two coordinates.
    pub(super) fn read_position(
        mut self,
        across: impl Stated<Measure>,
        along: impl Stated<Measure>,
        set: impl FnOnce(&mut T, [Measure; 2]),
    ) -> Self {
        match (across.read(), along.read()) {
            (Ok(across), Ok(along)) => set(&mut self.element, [across, along]),
            (across, along) => {
                self.wrong.extend(across.err().map(|error| ("at[0]", error)));
                self.wrong.extend(along.err().map(|error| ("at[1]", error)));
            }
        }
        self
    }
}

/// What can be added to a layout: the elements themselves and [`Piece`]s of them.
pub trait Element: sealed::Sealed {
    /// Adds it.
    #[doc(hidden)]
    fn put(self, builder: &mut LayoutBuilder);
}

mod sealed {
    pub trait Sealed {}
}

macro_rules! elements {
    ($($kind:ident in $list:ident),*) => {
        $(
            impl sealed::Sealed for $kind {}
            impl sealed::Sealed for Piece<$kind> {}

            impl Element for $kind {
                fn put(self, builder: &mut LayoutBuilder) {
                    builder.layout.$list.push(self);
                }
            }

            impl Element for Piece<$kind> {
                fn put(self, builder: &mut LayoutBuilder) {
                    let index = builder.layout.$list.len();
                    for (key, error) in &self.wrong {
                        let path = format!(concat!(stringify!($list), "[{}].{}"), index, key);
                        builder.faults.push(unreadable(error, path).of(&self.element.id));
                    }
                    self.element.put(builder);
                }
            }
        )*
    };
}

elements! {
    Level in levels, Fixture in fixtures, Joint in joints, Drain in drains, Vent in vents, Terminal in terminals,
    Valve in valves, Cleanout in cleanouts
}

impl sealed::Sealed for Sewer {}
impl sealed::Sealed for Piece<Sewer> {}

impl Element for Sewer {
    fn put(self, builder: &mut LayoutBuilder) {
        builder.layout.sewer = self;
        builder.sewers += 1;
    }
}

impl Element for Piece<Sewer> {
    fn put(self, builder: &mut LayoutBuilder) {
        for (key, error) in &self.wrong {
            builder.faults.push(unreadable(error, format!("sewer.{key}")));
        }
        self.element.put(builder);
    }
}
