//! Drawing a layout in Rust.

mod drainage;
mod piece;
mod stated;
mod venting;

use super::{Format, Id, Layout, Sewer};
use crate::error::{Error, ErrorKind, Fault, FaultCode, Faults};
use crate::quantity::{LengthUnit, PipeSize, QuantityError};

pub use piece::*;
pub use stated::Stated;

/// Gathers the elements of a layout; made by [`Layout::builder`].
///
/// ```
/// use dwv_core::layout::{Drain, Fixture, Joint, Layout, Level, Sewer, Terminal, Vent};
/// use dwv_core::quantity::Measure;
///
/// let layout = Layout::builder("Heron, kitchen", "npc-2015")
///     .frost(true)
///     .add(Level::new("basement", "-2.7 m"))
///     .add(Level::new("main", "0 m"))
///     .add(Fixture::new("KS", "kitchen-sink", "main").height("450 mm"))
///     .add(Joint::new("J1", "main").height("0.4 m"))
///     .add(Joint::new("S", "basement"))
///     .add(Drain::level("d1", "KS", "J1").length("3'-6 1/2\"").size("1-1/2"))
///     .add(Drain::vertical("d2", "J1", "S"))
///     .add(Vent::new("v1", "J1", "T1").length("6.1 m"))
///     .add(Terminal::roof("T1"))
///     .add(Sewer::new("S").invert("-3.95 m"))
///     .build()?;
/// assert_eq!(layout.drains[0].length, Some(Measure::parse("3'-6 1/2\"")?));
///
/// // What cannot be read is reported when the layout is built, all of it together.
/// let error = Layout::builder("Heron", "npc-2015")
///     .add(Level::new("main", "0 cubits"))
///     .add(Drain::level("d1", "KS", "S").size("1-3/8"))
///     .add(Sewer::new("S"))
///     .build()
///     .unwrap_err();
/// assert_eq!(error.faults()[0].path, "levels[0].floor");
/// assert_eq!(error.faults()[1].path, "drains[0].size");
/// # Ok::<(), Box<dyn std::error::Error>>(())
/// ```
#[derive(Debug)]
#[must_use = "a layout is made by `build`"]
pub struct LayoutBuilder {
    layout: Layout,
    sewers: usize,
    faults: Faults,
}

impl Layout {
    /// Begins a layout with its name and the id of the code edition to size by.
    pub fn builder(name: impl Into<Id>, edition: impl Into<Id>) -> LayoutBuilder {
        let layout = Layout {
            schema: None,
            format: Format::Version1,
            name: name.into(),
            edition: edition.into(),
            units: None,
            frost_can_close_vents: None,
            pipe_sizes: None,
            building_drain_ends_at: None,
            levels: Vec::new(),
            fixtures: Vec::new(),
            joints: Vec::new(),
            drains: Vec::new(),
            vents: Vec::new(),
            terminals: Vec::new(),
            valves: Vec::new(),
            cleanouts: Vec::new(),
            sewer: Sewer { at: Id::default(), invert: None },
        };
        LayoutBuilder { layout, sewers: 0, faults: Faults::default() }
    }
}

impl LayoutBuilder {
    /// Declares the unit of lengths that are bare numbers.
    pub fn units(mut self, unit: LengthUnit) -> Self {
        self.layout.units = Some(unit);
        self
    }

    /// States whether frost can close a vent where it passes the roof.
    pub fn frost(mut self, can_close_vents: bool) -> Self {
        self.layout.frost_can_close_vents = Some(can_close_vents);
        self
    }

    /// States the pipe sizes at hand.
    pub fn sizes<S: Stated<PipeSize>>(mut self, sizes: impl IntoIterator<Item = S>) -> Self {
        let mut read = Vec::new();
        for (index, size) in sizes.into_iter().enumerate() {
            match size.read() {
                Ok(size) => read.push(size),
                Err(error) => self.faults.push(unreadable(&error, format!("pipe_sizes[{index}]"))),
            }
        }
        self.layout.pipe_sizes = Some(read);
        self
    }

    /// Marks the joint where the building drain ends upstream.
    pub fn building_drain_ends_at(mut self, joint: impl Into<Id>) -> Self {
        self.layout.building_drain_ends_at = Some(joint.into());
        self
    }

    /// Adds an element: a level, fixture, joint, drain, vent, terminal, valve, cleanout or the sewer connection.
    #[expect(clippy::should_implement_trait, reason = "elements are added, nothing is summed")]
    pub fn add(mut self, element: impl Element) -> Self {
        element.put(&mut self);
        self
    }

    /// Adds many elements of one kind.
    pub fn add_all(self, elements: impl IntoIterator<Item = impl Element>) -> Self {
        elements.into_iter().fold(self, Self::add)
    }

    /// The layout.
    ///
    /// # Errors
    /// All quantities that cannot be read, each with its path; a layout without a sewer connection or with two.
    pub fn build(mut self) -> Result<Layout, Error> {
        let sewer = match self.sewers {
            1 => None,
            0 => Some((
                FaultCode::MissingKey,
                "the layout has no sewer connection",
                "add `Sewer::new` with the joint where the piping ends",
            )),
            _ => Some((FaultCode::RepeatedKey, "the layout has more than one sewer connection", "add one only")),
        };
        let kind = if sewer.is_some() { ErrorKind::Drawing } else { ErrorKind::Quantity };
        if let Some((code, message, help)) = sewer {
            self.faults.push(Fault::new(code, "sewer", message).help(help));
        }
        self.faults.into_result(kind, self.layout)
    }
}

/// The fault for a quantity that cannot be read.
fn unreadable(error: &QuantityError, path: String) -> Fault {
    let code = match error {
        QuantityError::OutOfRange { .. } => FaultCode::OutOfRange,
        _ => FaultCode::WrongQuantity,
    };
    Fault::new(code, path, error.to_string())
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::layout::{Drain, Fixture, Joint, Level};

    fn faults(builder: LayoutBuilder) -> Vec<(String, Option<String>)> {
        let error = builder.build().unwrap_err();
        error.faults().iter().map(|fault| (fault.path.clone(), fault.element.clone())).collect()
    }

    #[test]
    fn reports_everything_that_cannot_be_read() {
        let builder = Layout::builder("Heron", "npc-2015")
            .sizes(["2", "2-3/8"])
            .add(Level::new("main", f64::NAN))
            .add(Fixture::new("KS", "kitchen-sink", "main").at("1 m", "2 leagues").trap("1-1/2"))
            .add(Drain::sloped("d1", "KS", "S").slope("steep").length("").size(7))
            .add(Sewer::new("S").invert("9999999999 m"));
        let place = |path: &str, element: Option<&str>| (path.to_owned(), element.map(str::to_owned));
        let expected = [
            place("pipe_sizes[1]", None),
            place("levels[0].floor", Some("main")),
            place("fixtures[0].at[1]", Some("KS")),
            place("drains[0].slope", Some("d1")),
            place("drains[0].length", Some("d1")),
            place("drains[0].size", Some("d1")),
            place("sewer.invert", None),
        ];
        assert_eq!(faults(builder), expected);
    }

    #[test]
    fn needs_one_sewer_connection() {
        let builder = || Layout::builder("Heron", "npc-2015").add(Joint::new("S", "main"));
        assert_eq!(faults(builder()), [("sewer".to_owned(), None)]);
        assert_eq!(faults(builder().add(Sewer::new("S")).add(Sewer::new("S"))), [("sewer".to_owned(), None)]);
        assert_eq!(builder().add(Sewer::new("S")).build().unwrap().joints.len(), 1);
    }

    #[test]
    fn takes_plain_elements_too() {
        let drawn = Layout::builder("Heron", "npc-2015")
            .add_all(["S", "T"].map(|id| Joint::new(id, "main")))
            .add(Sewer::new("S"))
            .build()
            .unwrap();
        let again = Layout::builder("Heron", "npc-2015")
            .add_all(drawn.joints.clone())
            .add(drawn.sewer.clone())
            .build()
            .unwrap();
        assert_eq!(drawn, again);
    }
}
