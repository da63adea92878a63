//! Layouts.

use std::hash::{Hash, Hasher};

use pyo3::prelude::*;

use crate::refusal::run;

/// A drawn drainage and vent system, read from JSON.
#[pyclass(frozen, subclass, eq, hash, module = "dwv._dwv")]
#[derive(PartialEq)]
pub(crate) struct Layout {
    /// The drawing as the core holds it.
    pub(crate) drawing: dwv_core::Layout,
}

#[pymethods]
impl Layout {
    #[new]
    #[pyo3(signature = (json, /))]
    fn new(py: Python<'_>, json: &[u8]) -> PyResult<Self> {
        run(py, || Ok(Self { drawing: dwv_core::Layout::from_json(json)? }))
    }

    /// What the drawing is called.
    #[getter]
    fn name(&self) -> &str {
        &self.drawing.name
    }

    /// The id of the code edition that the drawing names.
    #[getter]
    fn edition(&self) -> &str {
        &self.drawing.edition
    }

    /// How many fixtures, drains and vents it has.
    fn _counts(&self) -> (usize, usize, usize) {
        (self.drawing.fixtures.len(), self.drawing.drains.len(), self.drawing.vents.len())
    }

    /// The text of a layout file, which reads back to the same layout: one element a line.
    fn to_json(&self, py: Python<'_>) -> PyResult<String> {
        run(py, || Ok(self.drawing.to_json()))
    }
}

impl Hash for Layout {
    /// Goes by names alone, so that equal layouts agree whatever numbers they hold.
    fn hash<H: Hasher>(&self, state: &mut H) {
        let drawing = &self.drawing;
        (&drawing.name, &drawing.edition).hash(state);
        drawing.fixtures.iter().for_each(|fixture| fixture.id.hash(state));
        drawing.drains.iter().for_each(|drain| drain.id.hash(state));
    }
}

/// The JSON Schema of layout files.
#[pyfunction]
pub(crate) fn layout_schema() -> &'static str {
    include_str!("../../dwv-core/schemas/dwv-layout-1.schema.json")
}
