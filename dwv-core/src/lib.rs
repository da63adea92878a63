//! Names, loads, sizes and grades of building drainage, waste and vent piping, with the clause behind each number.
//!
//! The way of a layout through the engine is [`sizing_run::Columns::run`]: a drawing ([`layout`]) becomes a [`network`]; its
//! pipes get loads ([`loading`]), names ([`naming`]), sizes ([`sizing`]) and grades ([`grading`]); checks ([`checking`]) tell
//! what breaks the code; [`explain`] and [`schedule`] put the answer into words and tables. What the code says is data ([`edition`]).
//!
//! Results support, and do not replace, the local code in force, the authority having jurisdiction and a licensed practitioner.
//!
//! ```
//! use dwv_core::{Layout, Sizing};
//!
//! let layout = Layout::from_json(br#"{
//!   "format": "dwv-layout/1", "name": "one sink", "edition": "npc-2015", "frost_can_close_vents": true,
//!   "levels":    [ { "id": "main", "floor": "0 m" } ],
//!   "fixtures":  [ { "id": "KS", "kind": "kitchen-sink", "level": "main", "height": "0.45 m" } ],
//!   "joints":    [ { "id": "J1", "level": "main", "height": "0.4 m" }, { "id": "S", "level": "main", "height": "-1 m" } ],
//!   "drains":    [ { "id": "d1", "from": "KS", "to": "J1", "runs": "level", "length": "0.9 m" },
//!                  { "id": "d2", "from": "J1", "to": "S", "runs": "vertical" } ],
//!   "vents":     [ { "id": "v1", "from": "J1", "to": "T1", "length": "6.1 m" } ],
//!   "terminals": [ { "id": "T1", "through": "roof", "above": "300 mm" } ],
//!   "sewer":     { "at": "S", "invert": "-1 m" }
//! }"#)?;
//! let sizing = Sizing::of_layout(&layout)?;
//! let arm = sizing.pipes().into_iter().find(|pipe| pipe.id == "d1").unwrap();
//! assert_eq!((arm.name, arm.size.unwrap().text()), ("trap arm", "1-1/2"));
//! println!("{}", sizing.why("v1")?);
//! # Ok::<(), dwv_core::Error>(())
//! ```
#![forbid(unsafe_code)]

pub mod checking;
pub mod edition;
pub mod error;
pub mod explain;
pub mod grading;
pub mod layout;
pub mod loading;
pub mod naming;
pub mod network;
pub mod quantity;
pub mod schedule;
pub mod sizing;
pub mod sizing_run;

pub use edition::Edition;
pub use error::{Error, ErrorKind, Fault, FaultCode};
pub use layout::Layout;
pub use network::Network;
pub use sizing_run::{Columns, Sizing, Unattested};

/// The README's examples run as tests.
#[cfg(doctest)]
#[doc = include_str!("../../README.md")]
mod readme {}
