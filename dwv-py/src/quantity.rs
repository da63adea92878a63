//! Plain reckoning with lengths and slopes.

use dwv_core::quantity::{Length, Slope};
use pyo3::prelude::*;
use pyo3::types::PyString;

use crate::refusal::{Refusal, run};

/// How far a pipe falls over a length, exactly, in the unit of the length, or in inches where that is feet.
#[pyfunction]
#[pyo3(signature = (length, slope, /))]
pub(crate) fn fall(py: Python<'_>, length: &Bound<'_, PyString>, slope: &Bound<'_, PyString>) -> PyResult<String> {
    let (length, slope) = (length.to_string_lossy(), slope.to_string_lossy());
    run(py, || {
        let length = Length::parse(&length).map_err(|error| Refusal::Quantity("length", error))?;
        let slope = Slope::parse(&slope).map_err(|error| Refusal::Quantity("slope", error))?;
        Ok(slope.value.fall_as_written(length).to_string())
    })
}

/// A length in metres.
#[pyfunction]
#[pyo3(signature = (text, /))]
pub(crate) fn length_m(py: Python<'_>, text: &Bound<'_, PyString>) -> PyResult<f64> {
    let text = text.to_string_lossy();
    run(py, || {
        let length = Length::parse(&text).map_err(|error| Refusal::Quantity("text", error))?;
        Ok(length.value.nanometres() as f64 / 1e9)
    })
}
