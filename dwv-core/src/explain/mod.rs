//! Answers in words: what a pipe is called and why, and what asks for its size.

mod name_words;
mod reason_words;

pub use name_words::{drain_name, name_reason, stated_name, vent_name};
pub use reason_words::{rule_name, says};
