//! Changing a file as a tree, and values to put in it.

use std::borrow::Cow;

use crate::layout::diagnose::tree::Node;

/// The members of an object.
pub(super) type Members = Vec<(Cow<'static, str>, Node<'static>)>;

/// Changes the member at a place: indexes of members and items, the last that of the member. Does nothing where an
/// earlier change took the place away.
pub(super) fn change(node: &mut Node<'static>, place: &[usize], edit: &mut dyn FnMut(&mut Members, usize)) {
    match (node, place) {
        (Node::Object(members), [at]) if *at < members.len() => edit(members, *at),
        (Node::Object(members), [at, rest @ ..]) if *at < members.len() => change(&mut members[*at].1, rest, edit),
        (Node::List(values), [at, rest @ ..]) if *at < values.len() => change(&mut values[*at], rest, edit),
        _ => {}
    }
}

pub(super) fn owned(node: &Node<'_>) -> Node<'static> {
    match node {
        Node::Null => Node::Null,
        Node::Flag(flag) => Node::Flag(*flag),
        Node::Whole(number) => Node::Whole(*number),
        Node::Large(number) => Node::Large(*number),
        Node::Number(number) => Node::Number(*number),
        Node::Text(text) => Node::Text(Cow::Owned(text.to_string())),
        Node::List(values) => Node::List(values.iter().map(owned).collect()),
        Node::Object(members) => {
            Node::Object(members.iter().map(|(key, value)| (Cow::Owned(key.to_string()), owned(value))).collect())
        }
    }
}

pub(super) fn written(node: &Node<'_>) -> String {
    let quoted = |text: &str| serde_json::to_string(text).unwrap();
    match node {
        Node::Null => "null".to_owned(),
        Node::Flag(flag) => flag.to_string(),
        Node::Whole(number) => number.to_string(),
        Node::Large(number) => number.to_string(),
        Node::Number(number) => serde_json::to_string(number).unwrap(),
        Node::Text(text) => quoted(text),
        Node::List(values) => format!("[{}]", values.iter().map(written).collect::<Vec<_>>().join(", ")),
        Node::Object(members) => {
            let members = members.iter().map(|(key, value)| format!("{}: {}", quoted(key), written(value)));
            format!("{{{}}}", members.collect::<Vec<_>>().join(", "))
        }
    }
}

/// One value of each kind that may stand in a file, and some near the limits.
pub(super) fn values() -> Vec<Node<'static>> {
    let text = |text: &str| Node::Text(text.to_owned().into());
    let texts = [
        "",
        " ",
        "x",
        "1.2 m",
        "1,2 m",
        "3'-6 1/2\"",
        "12",
        "1-1/2",
        "1.5 L/s",
        "1:50",
        "2 %",
        "1:0",
        "9999999999 m",
        "level",
        "Level",
        "trap-arm",
        "roof",
        "ft-in",
        "dwv-layout/1",
        "dwv-layout/2",
        "a\u{7}b",
        "\u{1F6BF}",
    ];
    let mut values: Vec<Node<'static>> = texts.into_iter().map(text).collect();
    values.extend([text(&"long".repeat(40)), Node::Null, Node::Flag(true), Node::Flag(false)]);
    values.extend([0, 1, 2, 90, -1, 65_535, 65_536, i64::MIN].map(Node::Whole));
    values.extend([
        Node::Large(u64::MAX),
        Node::Number(1.5),
        Node::Number(-0.5),
        Node::Number(90.0),
        Node::Number(1e300),
    ]);
    let pair = |first: &str, second: Node<'static>| Node::List(vec![text(first), second]);
    values.extend([
        Node::List(Vec::new()),
        Node::List(vec![Node::Null]),
        Node::List(vec![Node::Whole(1)]),
        Node::List(vec![text("2")]),
        pair("1 m", Node::Whole(2)),
        pair("main", text("0 m")),
        pair("1 m", Node::Null),
        Node::List(vec![Node::Whole(1), Node::Whole(2), Node::Whole(3)]),
        Node::List(vec![Node::Object(Vec::new())]),
        Node::Object(Vec::new()),
        Node::Object(vec![("level".into(), Node::Null)]),
        Node::Object(vec![("at".into(), text("J1"))]),
        Node::Object(vec![("id".into(), text("x")), ("id".into(), text("y"))]),
    ]);
    values
}
