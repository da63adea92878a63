//! The look of a written layout file: one key of the layout a line, one element a line.

use std::io::{self, Write};

use serde::Serialize;
use serde_json::ser::{Formatter, Serializer};

use crate::layout::Layout;

/// The text of a layout file, with a line break at its end.
pub(super) fn text(layout: &Layout) -> String {
    let mut bytes = Vec::with_capacity(4096);
    // Writing plain data to memory does not fail.
    let written = layout.serialize(&mut Serializer::with_formatter(&mut bytes, Lines::default()));
    debug_assert!(written.is_ok());
    bytes.push(b'\n');
    String::from_utf8(bytes).unwrap_or_default()
}

/// Breaks lines between the keys of the outermost object and between the elements of its lists.
#[derive(Default)]
struct Lines {
    /// How many lists and objects are open.
    depth: usize,
    /// Whether a value of a list of the outermost object begins here, and whether it is the first.
    element: Option<bool>,
    /// Whether the open list of the outermost object holds objects.
    broken: bool,
}

impl Lines {
    /// Begins a value that is no object: values of a list that are none stay on one line.
    fn plain<W: ?Sized + Write>(&mut self, out: &mut W) -> io::Result<()> {
        if self.element.take() == Some(false) { out.write_all(b" ") } else { Ok(()) }
    }
}

impl Formatter for Lines {
    fn begin_object<W: ?Sized + Write>(&mut self, out: &mut W) -> io::Result<()> {
        if self.element.take().is_some() {
            self.broken = true;
            out.write_all(b"\n    ")?;
        }
        self.depth += 1;
        out.write_all(b"{")
    }

    fn begin_object_key<W: ?Sized + Write>(&mut self, out: &mut W, first: bool) -> io::Result<()> {
        if !first {
            out.write_all(b",")?;
        }
        out.write_all(if self.depth == 1 { b"\n  " } else { b" " })
    }

    fn begin_object_value<W: ?Sized + Write>(&mut self, out: &mut W) -> io::Result<()> {
        out.write_all(b": ")
    }

    fn end_object<W: ?Sized + Write>(&mut self, out: &mut W) -> io::Result<()> {
        self.depth = self.depth.saturating_sub(1);
        out.write_all(if self.depth == 0 { b"\n}" } else { b" }" })
    }

    fn begin_array<W: ?Sized + Write>(&mut self, out: &mut W) -> io::Result<()> {
        self.plain(out)?;
        if self.depth == 1 {
            self.broken = false;
        }
        self.depth += 1;
        out.write_all(b"[")
    }

    fn begin_array_value<W: ?Sized + Write>(&mut self, out: &mut W, first: bool) -> io::Result<()> {
        if self.depth == 2 {
            self.element = Some(first);
        } else if !first {
            return out.write_all(b", ");
        }
        if first { Ok(()) } else { out.write_all(b",") }
    }

    fn end_array<W: ?Sized + Write>(&mut self, out: &mut W) -> io::Result<()> {
        self.depth = self.depth.saturating_sub(1);
        if self.depth == 1 && self.broken {
            out.write_all(b"\n  ")?;
        }
        out.write_all(b"]")
    }

    fn begin_string<W: ?Sized + Write>(&mut self, out: &mut W) -> io::Result<()> {
        self.plain(out)?;
        out.write_all(b"\"")
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::layout::{Drain, Fixture, Joint, Level, Sewer};
    use crate::quantity::{LengthUnit, Measure, PipeSize};

    #[test]
    fn one_element_stands_on_each_line() {
        let mut layout = Layout::builder("Heron", "npc-2015")
            .units(LengthUnit::Metre)
            .sizes([PipeSize::Two, PipeSize::Three])
            .add(Level::new("main", Measure::Number(0.0)))
            .add(Fixture::new("KS", "kitchen-sink", "main").at(7.25, "1.1 m"))
            .add(Joint::new("J1", "main"))
            .add(Joint::new("S", "main"))
            .add(Drain::level("d1", "KS", "J1").length("3'-6 1/2\"").underground())
            .add(Drain::level("d2", "J1", "S").length(2.5))
            .add(Sewer::new("S"))
            .build()
            .unwrap();
        let expected = r#"{
  "format": "dwv-layout/1",
  "name": "Heron",
  "edition": "npc-2015",
  "units": "m",
  "pipe_sizes": ["2", "3"],
  "levels": [
    { "id": "main", "floor": 0 }
  ],
  "fixtures": [
    { "id": "KS", "kind": "kitchen-sink", "level": "main", "at": [7.25, "1.1 m"] }
  ],
  "joints": [
    { "id": "J1", "level": "main" },
    { "id": "S", "level": "main" }
  ],
  "drains": [
    { "id": "d1", "from": "KS", "to": "J1", "runs": "level", "length": "3'-6 1/2\"", "underground": true },
    { "id": "d2", "from": "J1", "to": "S", "runs": "level", "length": 2.5 }
  ],
  "vents": [],
  "terminals": [],
  "sewer": { "at": "S" }
}
"#;
        assert_eq!(layout.to_json(), expected);
        layout.pipe_sizes = None;
        assert!(!layout.to_json().contains("pipe_sizes"));
    }
}
