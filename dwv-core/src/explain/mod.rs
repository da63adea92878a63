//! Answers in words: what a pipe is called and why, what asks for its size, how a trap gets its air.

mod name_words;
mod reason_words;
mod why;

pub use name_words::{drain_name, name_reason, stated_name, vent_name};
pub use reason_words::{rule_name, says};
