//! Results as rows and tables, for people and machines.

mod canonical;
mod finding_rows;
mod fixture_rows;
mod pipe_rows;
mod reason_rows;
mod schedules;
mod summary;
mod table;
mod why;

#[cfg(feature = "schema")]
pub use canonical::sizing_schema;
pub use finding_rows::FindingRow;
pub use fixture_rows::FixtureRow;
pub use pipe_rows::{PipeRow, TerminalRow, VentRow};
pub use reason_rows::{ReasonRow, Status};
pub use schedules::SCHEDULES;
pub use summary::Summary;
pub use table::Table;

/// The caution that every report carries.
pub const CAUTION: &str = "These results support, and do not replace, the local code in force, the authority having \
                           jurisdiction and a licensed practitioner.";
