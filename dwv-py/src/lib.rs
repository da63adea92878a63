//! The Python face of the engine: it translates and does nothing else.
//!
//! This module is private to the Python package `dwv`, which gives it names, types and docstrings.

mod edition;
mod layout;
mod quantity;
mod refusal;
mod sizing;
mod table;

/// The compiled part of the package `dwv`.
#[pyo3::pymodule(gil_used = false)]
mod _dwv {
    #[pymodule_export]
    use crate::edition::{Edition, edition_ids};
    #[pymodule_export]
    use crate::layout::{Layout, layout_schema};
    #[pymodule_export]
    use crate::quantity::{fall, length_m};
    #[pymodule_export]
    use crate::sizing::Sizing;
    #[pymodule_export]
    use crate::table::{table_csv, table_text};
    #[pymodule_export]
    #[expect(non_upper_case_globals, reason = "the name that Python packages give it")]
    const __version__: &str = env!("CARGO_PKG_VERSION");
}
