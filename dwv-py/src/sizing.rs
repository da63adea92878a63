//! Sized drawings.

use dwv_core::Unattested;
use pyo3::prelude::*;
use pyo3::sync::PyOnceLock;
use pyo3::types::PyString;

use crate::layout::Layout;
use crate::refusal::run;
use crate::table::Cells;

/// A sized drawing, with the drawing that it was made of.
#[pyclass(frozen, subclass, module = "dwv._dwv")]
pub(crate) struct Sizing {
    layout: Py<Layout>,
    sized: dwv_core::Sizing,
    /// The canonical result as Python rows; made when it is first asked for.
    result: PyOnceLock<Py<PyAny>>,
}

#[pymethods]
impl Sizing {
    /// Sizes a layout by an edition, or by the one that it names.
    #[new]
    #[pyo3(signature = (layout, /, edition = None, unattested = None))]
    fn new(
        py: Python<'_>,
        layout: Bound<'_, Layout>,
        edition: Option<&Bound<'_, PyString>>,
        unattested: Option<&Bound<'_, PyString>>,
    ) -> PyResult<Self> {
        let drawing = &layout.get().drawing;
        let edition = edition.map_or_else(|| drawing.edition.as_str().into(), |edition| edition.to_string_lossy());
        let unattested = unattested.map(|word| word.to_string_lossy());
        let sized = run(py, || {
            let edition = dwv_core::Edition::builtin(&edition)?;
            let unattested = unattested.map_or(Ok(Unattested::default()), |word| Unattested::parse(&word))?;
            Ok(dwv_core::Sizing::of(drawing, edition, unattested)?)
        })?;
        Ok(Self { layout: layout.unbind(), sized, result: PyOnceLock::new() })
    }

    /// The drawing.
    #[getter]
    fn layout(&self, py: Python<'_>) -> Py<Layout> {
        self.layout.clone_ref(py)
    }

    /// The id of the edition in force.
    #[getter]
    fn edition(&self) -> &str {
        &self.sized.edition.id
    }

    /// What is done with unattested values: `tell` or `refuse`.
    #[getter]
    fn unattested(&self) -> &'static str {
        match self.sized.unattested {
            Unattested::Tell => "tell",
            Unattested::Refuse => "refuse",
        }
    }

    /// The canonical result as Python rows.
    #[getter]
    fn _result(&self, py: Python<'_>) -> PyResult<Py<PyAny>> {
        let read = || py.import("dwv.rows")?.getattr("read_result")?.call1((self.to_json(py)?,)).map(Bound::unbind);
        Ok(self.result.get_or_try_init(py, read)?.clone_ref(py))
    }

    /// The whole result as JSON of the format `dwv-sizing/1`.
    ///
    /// Every face of the engine gives the same bytes. Lengths are in metres, loads in fixture units, sizes in inches.
    fn to_json(&self, py: Python<'_>) -> PyResult<String> {
        run(py, || Ok(self.sized.to_json()))
    }

    /// The whole report as aligned text: head, the four schedules, findings, caution.
    fn to_text(&self, py: Python<'_>) -> PyResult<String> {
        run(py, || Ok(self.sized.to_text()))
    }

    /// Why a pipe, fixture or terminal is what it is, in words.
    ///
    /// Tells its name, its load, every minimum with its clause and the governing one marked, its grade and what was found; for a
    /// fixture, how its trap gets its air.
    ///
    /// Args:
    ///     id: The id of a drain, vent, fixture or terminal.
    ///
    /// Raises:
    ///     QuestionError: Nothing has this id; the nearest is named.
    #[pyo3(signature = (id, /))]
    fn why(&self, py: Python<'_>, id: &Bound<'_, PyString>) -> PyResult<String> {
        let id = id.to_string_lossy();
        run(py, || Ok(self.sized.why(&id)?))
    }

    /// The parts of a schedule; none when no schedule has this name.
    #[pyo3(signature = (name, /))]
    fn _schedule(&self, py: Python<'_>, name: &Bound<'_, PyString>) -> PyResult<Option<Cells>> {
        let name = name.to_string_lossy();
        run(py, || {
            Ok(Some(Cells::from(match &*name {
                "pipes" => self.sized.pipe_schedule(),
                "vents" => self.sized.vent_schedule(),
                "fixtures" => self.sized.fixture_schedule(),
                "inverts" => self.sized.invert_schedule(),
                "findings" => self.sized.finding_schedule(),
                _ => return Ok(None),
            })))
        })
    }
}
