//! Tables of texts: their parts for Python, and the core's ways of writing them.

use dwv_core::schedule::Table;
use pyo3::prelude::*;

use crate::refusal::run;

/// The parts of a table: title, heads, which columns are set to the right, rows.
#[derive(IntoPyObject)]
pub(crate) struct Cells(String, Vec<String>, Vec<bool>, Vec<Vec<String>>);

impl From<Table> for Cells {
    fn from(table: Table) -> Self {
        Self(table.title, table.heads, table.right, table.rows)
    }
}

/// A table as aligned text.
#[pyfunction]
#[pyo3(signature = (title, heads, right, rows, /))]
pub(crate) fn table_text(
    py: Python<'_>,
    title: String,
    heads: Vec<String>,
    right: Vec<bool>,
    rows: Vec<Vec<String>>,
) -> PyResult<String> {
    run(py, || Ok(Table { title, heads, right, rows }.to_text()))
}

/// A table as comma-separated values.
#[pyfunction]
#[pyo3(signature = (title, heads, right, rows, /))]
pub(crate) fn table_csv(
    py: Python<'_>,
    title: String,
    heads: Vec<String>,
    right: Vec<bool>,
    rows: Vec<Vec<String>>,
) -> PyResult<String> {
    run(py, || Ok(Table { title, heads, right, rows }.to_csv()))
}
