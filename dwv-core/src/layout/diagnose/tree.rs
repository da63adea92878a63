//! A JSON text as a tree that keeps the order of keys and those that stand twice.

use std::borrow::Cow;
use std::fmt;

use serde::de::{Deserialize, Deserializer, Error, MapAccess, SeqAccess, Visitor};

/// A value of the file.
#[derive(Debug, Clone, PartialEq)]
pub(super) enum Node<'a> {
    Null,
    Flag(bool),
    Whole(i64),
    /// A whole number that is too large for the others.
    Large(u64),
    Number(f64),
    Text(Cow<'a, str>),
    List(Vec<Node<'a>>),
    Object(Vec<(Cow<'a, str>, Node<'a>)>),
}

impl Node<'_> {
    /// What was found, in words, with a short value in backticks.
    pub(super) fn words(&self) -> String {
        match self {
            Self::Null => "`null`".to_owned(),
            Self::Flag(flag) => format!("`{flag}`"),
            Self::Whole(number) => format!("the number `{number}`"),
            Self::Large(number) => format!("the number `{number}`"),
            Self::Number(number) => format!("the number `{number}`"),
            Self::Text(text) => format!("the text `{}`", shown(text)),
            Self::List(values) if values.is_empty() => "an empty list".to_owned(),
            Self::List(values) => format!("a list of {}", values.len()),
            Self::Object(_) => "an object".to_owned(),
        }
    }

    pub(super) fn text(&self) -> Option<&str> {
        match self {
            Self::Text(text) => Some(text),
            _ => None,
        }
    }

    pub(super) fn member(&self, key: &str) -> Option<&Self> {
        match self {
            Self::Object(members) => members.iter().find(|(name, _)| name == key).map(|(_, value)| value),
            _ => None,
        }
    }
}

/// The start of a text for a message: one line, cut when long.
pub(super) fn shown(text: &str) -> String {
    const LONGEST: usize = 60;
    let mut line = String::new();
    for (count, character) in text.chars().enumerate() {
        if count == LONGEST {
            line.push('…');
            break;
        }
        if character.is_control() { line.extend(character.escape_default()) } else { line.push(character) }
    }
    line
}

impl<'de> Deserialize<'de> for Node<'de> {
    fn deserialize<D: Deserializer<'de>>(reader: D) -> Result<Self, D::Error> {
        reader.deserialize_any(AnyValue)
    }
}

struct AnyValue;

impl<'de> Visitor<'de> for AnyValue {
    type Value = Node<'de>;

    fn expecting(&self, out: &mut fmt::Formatter<'_>) -> fmt::Result {
        out.write_str("a value")
    }

    fn visit_unit<E: Error>(self) -> Result<Node<'de>, E> {
        Ok(Node::Null)
    }

    fn visit_bool<E: Error>(self, flag: bool) -> Result<Node<'de>, E> {
        Ok(Node::Flag(flag))
    }

    fn visit_i64<E: Error>(self, number: i64) -> Result<Node<'de>, E> {
        Ok(Node::Whole(number))
    }

    fn visit_u64<E: Error>(self, number: u64) -> Result<Node<'de>, E> {
        Ok(i64::try_from(number).map_or(Node::Large(number), Node::Whole))
    }

    fn visit_f64<E: Error>(self, number: f64) -> Result<Node<'de>, E> {
        Ok(Node::Number(number))
    }

    fn visit_borrowed_str<E: Error>(self, text: &'de str) -> Result<Node<'de>, E> {
        Ok(Node::Text(Cow::Borrowed(text)))
    }

    fn visit_str<E: Error>(self, text: &str) -> Result<Node<'de>, E> {
        Ok(Node::Text(Cow::Owned(text.to_owned())))
    }

    fn visit_seq<A: SeqAccess<'de>>(self, mut list: A) -> Result<Node<'de>, A::Error> {
        let mut values = Vec::new();
        while let Some(value) = list.next_element()? {
            values.push(value);
        }
        Ok(Node::List(values))
    }

    fn visit_map<A: MapAccess<'de>>(self, mut object: A) -> Result<Node<'de>, A::Error> {
        let mut members = Vec::new();
        while let Some(Key(key)) = object.next_key()? {
            members.push((key, object.next_value()?));
        }
        Ok(Node::Object(members))
    }
}

/// A key, borrowed from the file where it is written without escapes.
struct Key<'a>(Cow<'a, str>);

impl<'de> Deserialize<'de> for Key<'de> {
    fn deserialize<D: Deserializer<'de>>(reader: D) -> Result<Self, D::Error> {
        match reader.deserialize_str(AnyValue)? {
            Node::Text(text) => Ok(Self(text)),
            _ => Err(D::Error::custom("a key is no text")),
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn keeps_order_and_repeated_keys() {
        let node: Node<'_> = serde_json::from_str(r#"{"b": 1, "a": [null, -2.5], "b": "\u00e9"}"#).unwrap();
        let Node::Object(members) = &node else { panic!("{node:?}") };
        let keys: Vec<&str> = members.iter().map(|(key, _)| key.as_ref()).collect();
        assert_eq!(keys, ["b", "a", "b"]);
        assert_eq!(members[1].1, Node::List(vec![Node::Null, Node::Number(-2.5)]));
        assert_eq!(members[2].1.text(), Some("é"));
    }

    #[test]
    fn shows_one_short_line() {
        assert_eq!(shown("a\nb"), "a\\nb");
        assert_eq!(shown(&"x".repeat(70)).chars().count(), 61);
    }
}
