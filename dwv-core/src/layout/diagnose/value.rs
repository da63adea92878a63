//! What is wrong with one value that is neither a list nor an object of the format.

use super::form::{FORMAT, Value};
use super::tree::{Node, shown};
use crate::error::{FaultCode, nearest};
use crate::layout::limits;
use crate::quantity::{FixtureUnits, FlowRate, LengthUnit, Measure, PipeSize, QuantityError, Slope};

/// A fault without its place.
#[derive(Debug, PartialEq)]
pub(super) struct Wrong {
    pub(super) code: FaultCode,
    pub(super) message: String,
    pub(super) help: Option<String>,
}

impl Wrong {
    pub(super) fn new(code: FaultCode, message: impl Into<String>) -> Self {
        Self { code, message: message.into(), help: None }
    }

    pub(super) fn help(mut self, help: impl Into<String>) -> Self {
        self.help = Some(help.into());
        self
    }

    /// A value of another type.
    pub(super) fn kind(found: &Node<'_>, expected: &str) -> Self {
        Self::new(FaultCode::WrongType, format!("{} stands here, expected {expected}", found.words()))
    }
}

/// Judges a value that stands alone.
pub(super) fn judge(expected: &Value, found: &Node<'_>) -> Result<(), Wrong> {
    match expected {
        Value::Format => found.text().map(|_| ()).ok_or_else(|| Wrong::kind(found, "the text `dwv-layout/1`")),
        Value::Text => found.text().map(|_| ()).ok_or_else(|| Wrong::kind(found, "text")),
        Value::Id => id(found),
        Value::Word(words) => word(found, words.iter().copied()),
        Value::Unit => match found {
            Node::Text(text) if LengthUnit::parse(text).is_ok() => Ok(()),
            _ => word(found, LengthUnit::ALL.into_iter().map(LengthUnit::symbol)),
        },
        Value::Length => match found {
            Node::Whole(_) | Node::Large(_) | Node::Number(_) => Ok(()),
            _ => quantity(found, "a length such as `1.2 m` or `3'-6 1/2\"`, or a number", Measure::parse),
        },
        Value::Slope => quantity(found, "a slope such as `1:50` or `2 %`", Slope::parse),
        Value::Flow => quantity(found, "a flow such as `0.3 L/s`", FlowRate::parse),
        Value::Size => match found {
            Node::Whole(number) => size(&number.to_string()),
            Node::Large(number) => size(&number.to_string()),
            Node::Number(number) => size(&number.to_string()),
            _ => quantity(found, "a pipe size such as `1-1/2`", PipeSize::parse),
        },
        Value::Load => match found {
            Node::Whole(number) => load(*number as f64),
            Node::Large(number) => load(*number as f64),
            Node::Number(number) => load(*number),
            _ => quantity(found, "a number of fixture units such as `1.5`", FixtureUnits::parse),
        },
        Value::Flag => match found {
            Node::Flag(_) => Ok(()),
            _ => Err(Wrong::kind(found, "`true` or `false`")),
        },
        Value::Degrees => degrees(found),
        Value::Position | Value::List(_) | Value::Object(_) => Ok(()),
    }
}

/// Judges the name of the format. Says too whether the rest of the file is worth judging by this format.
pub(super) fn format(found: Option<&Node<'_>>) -> (Option<Wrong>, bool) {
    const HELP: &str = "write `\"format\": \"dwv-layout/1\"`";
    let wrong = |message: String| Wrong::new(FaultCode::WrongFormat, message);
    match found {
        None => (Some(wrong("the file does not name its format".to_owned()).help(HELP)), true),
        Some(Node::Text(text)) if text == FORMAT => (None, true),
        Some(Node::Text(text)) => {
            let message = format!("the format is `{}`, expected `{FORMAT}`", shown(text));
            let version = text.strip_prefix("dwv-layout/").is_some_and(|version| version.parse::<u32>().is_ok());
            if version {
                return (Some(wrong(message).help("this release reads version 1 only")), false);
            }
            let near = nearest(text, [FORMAT]).is_some();
            (Some(wrong(message).help(HELP)), near)
        }
        Some(other) => (Some(wrong(format!("the format is {}, expected `{FORMAT}`", other.words())).help(HELP)), true),
    }
}

fn id(found: &Node<'_>) -> Result<(), Wrong> {
    let Some(id) = found.text() else { return Err(Wrong::kind(found, "an id, such as `KS`")) };
    let bad = |message: String| Err(Wrong::new(FaultCode::BadId, message));
    if id.trim().is_empty() {
        bad("the id is empty, expected short text such as `KS`".to_owned())
    } else if id.len() > limits::LONGEST_ID {
        let start: String = id.chars().take(20).collect();
        bad(format!("the id `{}…` has {} bytes, expected at most {}", shown(&start), id.len(), limits::LONGEST_ID))
    } else if id.chars().any(char::is_control) {
        bad(format!("the id `{}` holds a control character", shown(id)))
    } else {
        Ok(())
    }
}

fn word(found: &Node<'_>, words: impl Iterator<Item = &'static str> + Clone) -> Result<(), Wrong> {
    let list: Vec<String> = words.clone().map(|word| format!("`{word}`")).collect();
    let list = list.join(", ");
    let Some(text) = found.text() else { return Err(Wrong::kind(found, &format!("one of {list}"))) };
    if words.clone().any(|word| word == text) {
        return Ok(());
    }
    let wrong =
        Wrong::new(FaultCode::UnknownWord, format!("`{}` is not known here, expected one of {list}", shown(text)));
    let plain = text.trim().replace([' ', '_'], "-");
    Err(match nearest(&plain, words) {
        Some(near) => wrong.help(format!("did you mean `{near}`?")),
        None => wrong,
    })
}

fn quantity<Q>(found: &Node<'_>, expected: &str, read: fn(&str) -> Result<Q, QuantityError>) -> Result<(), Wrong> {
    let Some(text) = found.text() else { return Err(Wrong::kind(found, expected)) };
    read(text).map(|_| ()).map_err(unreadable)
}

fn size(number: &str) -> Result<(), Wrong> {
    PipeSize::parse(number).map(|_| ()).map_err(unreadable)
}

fn load(number: f64) -> Result<(), Wrong> {
    FixtureUnits::from_number(number).map(|_| ()).map_err(unreadable)
}

/// A quantity that cannot be read, in one line.
fn unreadable(error: QuantityError) -> Wrong {
    let code = match error {
        QuantityError::OutOfRange { .. } => FaultCode::OutOfRange,
        _ => FaultCode::WrongQuantity,
    };
    let line = error.to_string();
    let line = line.chars().flat_map(|character| {
        let escaped = character.is_control().then(|| character.escape_default().to_string());
        escaped.unwrap_or_else(|| character.to_string()).chars().collect::<Vec<_>>()
    });
    Wrong::new(code, line.collect::<String>())
}

fn degrees(found: &Node<'_>) -> Result<(), Wrong> {
    match found {
        Node::Whole(number) if u16::try_from(*number).is_ok() => Ok(()),
        Node::Whole(_) | Node::Large(_) => Err(Wrong::new(
            FaultCode::OutOfRange,
            format!("{} stands here, expected degrees from 0 to {}", found.words(), u16::MAX),
        )),
        _ => Err(Wrong::kind(found, "a whole number of degrees, such as `90`")),
    }
}
