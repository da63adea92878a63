//! Errors and panics of the engine as Python exceptions.

use std::panic::{AssertUnwindSafe, catch_unwind};

use dwv_core::error::{ErrorKind, Fault, FaultCode};
use dwv_core::quantity::QuantityError;
use pyo3::prelude::*;
use pyo3::sync::PyOnceLock;

/// Why the engine gives no answer.
pub(crate) enum Refusal {
    /// The core refuses an input.
    Input(dwv_core::Error),
    /// A single quantity cannot be read: the argument that holds it, and what is wrong.
    Quantity(&'static str, QuantityError),
}

impl From<dwv_core::Error> for Refusal {
    fn from(error: dwv_core::Error) -> Self {
        Self::Input(error)
    }
}

/// Runs the engine without holding the interpreter; what it refuses and a panic become exceptions.
pub(crate) fn run<T: Send>(py: Python<'_>, work: impl FnOnce() -> Result<T, Refusal> + Send) -> PyResult<T> {
    // Nothing is looked at after a panic: every input is immutable, and the half-made answer is dropped.
    match py.detach(|| catch_unwind(AssertUnwindSafe(work))) {
        Ok(Ok(answer)) => Ok(answer),
        Ok(Err(refusal)) => Err(refusal.into_exception(py)),
        Err(payload) => {
            let words = payload
                .downcast_ref::<String>()
                .map(String::as_str)
                .or_else(|| payload.downcast_ref::<&str>().copied())
                .unwrap_or("no words");
            let message = format!("internal error of the engine, please report it: {words}");
            Err(exception(py, "InternalError", message, &[], 0))
        }
    }
}

impl Refusal {
    fn into_exception(self, py: Python<'_>) -> PyErr {
        match self {
            Self::Input(error) => {
                let class = match error.kind() {
                    ErrorKind::Format => "FormatError",
                    ErrorKind::Drawing => "DrawingError",
                    ErrorKind::Quantity => "QuantityError",
                    ErrorKind::Edition => "EditionError",
                    ErrorKind::Question => "QuestionError",
                    // A kind that this face does not know yet is still an error of the package.
                    _ => "DwvError",
                };
                exception(py, class, error.to_string(), error.faults(), error.total())
            }
            Self::Quantity(path, error) => {
                let message = error.to_string();
                let fault =
                    Fault { code: FaultCode::WrongQuantity, path: path.to_owned(), element: None, message, help: None };
                exception(py, "QuantityError", fault.to_string(), &[fault], 1)
            }
        }
    }
}

/// An exception of the class `class` of `dwv.errors`; the reason why it could not be made, when it could not.
fn exception(py: Python<'_>, class: &str, message: String, faults: &[Fault], total: usize) -> PyErr {
    static ERRORS: PyOnceLock<Py<PyModule>> = PyOnceLock::new();
    let made = || {
        let errors = ERRORS.get_or_try_init(py, || py.import("dwv.errors").map(Bound::unbind))?.bind(py);
        let fault = errors.getattr("Fault")?;
        let faults = faults
            .iter()
            .map(|row| {
                fault.call1((row.code.name(), &row.path, row.element.as_deref(), &row.message, row.help.as_deref()))
            })
            .collect::<PyResult<Vec<_>>>()?;
        let faults = pyo3::types::PyTuple::new(py, faults)?;
        errors.getattr(class)?.call1((message, faults, total))
    };
    match made() {
        Ok(exception) => PyErr::from_value(exception),
        Err(error) => error,
    }
}
