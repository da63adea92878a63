//! Code editions and questions to them.

use std::sync::Arc;

use pyo3::prelude::*;
use pyo3::types::PyString;

use crate::refusal::run;

/// A code edition that comes with the engine.
#[pyclass(frozen, module = "dwv._dwv")]
pub(crate) struct Edition {
    edition: Arc<dwv_core::Edition>,
}

#[pymethods]
impl Edition {
    #[new]
    #[pyo3(signature = (id, /))]
    fn new(py: Python<'_>, id: &Bound<'_, PyString>) -> PyResult<Self> {
        let id = id.to_string_lossy();
        run(py, || Ok(Self { edition: dwv_core::Edition::builtin(&id)? }))
    }

    /// Its id.
    #[getter]
    fn id(&self) -> &str {
        &self.edition.id
    }

    /// Its title in full.
    #[getter]
    fn title(&self) -> &str {
        &self.edition.title
    }

    /// Where its values come from, in Markdown.
    fn provenance(&self, py: Python<'_>) -> PyResult<String> {
        run(py, || Ok(self.edition.provenance()))
    }

    /// The values that nobody has seen in print: clause, what it says, how sure it is.
    fn unattested(&self, py: Python<'_>) -> PyResult<Vec<String>> {
        run(py, || {
            let words = |id| {
                let citation = self.edition.citation(id);
                format!("{}: {} ({})", citation.clause, citation.subject, citation.witness.words())
            };
            Ok(self.edition.unattested().map(words).collect())
        })
    }

    /// The kinds of fixtures that it lists.
    fn fixture_kinds(&self) -> Vec<&str> {
        self.edition.fixtures.rows.iter().map(|row| row.key.as_str()).collect()
    }

    /// The answer to a question in JSON: its text, its clause and the name of its witness.
    #[pyo3(signature = (question, /))]
    fn answer(&self, py: Python<'_>, question: &Bound<'_, PyString>) -> PyResult<(String, String, &'static str)> {
        let question = question.to_string_lossy();
        run(py, || {
            let answer = self.edition.answer_json(&question)?;
            Ok((answer.text, answer.clause, answer.witness.name()))
        })
    }
}

/// The ids of the editions that come with the engine.
#[pyfunction]
pub(crate) fn edition_ids() -> Vec<&'static str> {
    dwv_core::Edition::builtin_ids()
}
