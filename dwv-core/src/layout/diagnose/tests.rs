//! The description of the format against the types that the quick reader fills.

mod edit;
mod full;
mod slips;

use std::collections::BTreeSet;

use self::edit::{change, owned, values, written};
use self::full::full;
use super::form::{Form, LAYOUT, Presence, Value};
use super::tree::Node;
use super::*;
use crate::layout::file::read;
use crate::quantity::LengthUnit;

fn tree(text: &str) -> Node<'_> {
    serde_json::from_str(text).unwrap()
}

/// The faults that `explain` finds, but for ids: those are judged when a network is made.
fn explained(bytes: &[u8]) -> Vec<Fault> {
    let faults = explain(bytes).into_result(ErrorKind::Format, ()).err();
    let faults = faults.map(|error| error.faults().to_vec()).unwrap_or_default();
    faults.into_iter().filter(|fault| fault.code != FaultCode::BadId).collect()
}

/// Checks that each object has just the keys of its form, in that order.
fn same_keys(form: &Form, node: &Node<'_>) {
    let Node::Object(members) = node else { panic!("{} is {}", form.what, node.words()) };
    let found: Vec<&str> = members.iter().map(|(key, _)| key.as_ref()).collect();
    let described: Vec<&str> = form.fields.iter().map(|field| field.key).collect();
    assert_eq!(found, described, "{}", form.what);
    for (field, (_, value)) in form.fields.iter().zip(members) {
        match (&field.value, value) {
            (Value::Object(inner), value) => same_keys(inner, value),
            (Value::List(Value::Object(inner)), Node::List(values)) => same_keys(inner, &values[0]),
            _ => {}
        }
    }
}

#[test]
fn describes_every_key_of_the_types() {
    let text = full().to_json();
    same_keys(&LAYOUT, &tree(&text));
    assert_eq!(explained(text.as_bytes()), []);
    assert_eq!(read(text.as_bytes()), Some(full()));
}

/// Walks all objects of the file together with their forms, and visits each key of each.
fn for_each_key(
    form: &'static Form,
    node: &Node<'_>,
    place: &mut Vec<usize>,
    visit: &mut dyn FnMut(&[usize], &'static form::Field),
) {
    let Node::Object(members) = node else { return };
    for (at, (field, (_, value))) in form.fields.iter().zip(members).enumerate() {
        place.push(at);
        visit(place, field);
        match (&field.value, value) {
            (Value::Object(inner), value) => for_each_key(inner, value, place, visit),
            (Value::List(Value::Object(inner)), Node::List(values)) => {
                place.push(0);
                for_each_key(inner, &values[0], place, visit);
                place.pop();
            }
            _ => {}
        }
        place.pop();
    }
}

fn full_tree() -> Node<'static> {
    let text = full().to_json();
    owned(&tree(&text))
}

fn keys() -> Vec<(Vec<usize>, &'static form::Field)> {
    let mut keys = Vec::new();
    for_each_key(&LAYOUT, &full_tree(), &mut Vec::new(), &mut |place, field| keys.push((place.to_vec(), field)));
    keys
}

/// Leaving a key out, or writing `null` for it, is refused by the reader just where the description says so.
#[test]
fn describes_which_keys_must_be_there() {
    let keys = keys();
    assert!(keys.len() > 60, "{}", keys.len());
    for (place, field) in keys {
        let mut without = full_tree();
        change(&mut without, &place, &mut |members, at| {
            members.remove(at);
        });
        let accepted = read(written(&without).as_bytes()).is_some();
        assert_eq!(accepted, field.presence != Presence::Required, "without {}", field.key);

        let mut null = full_tree();
        change(&mut null, &place, &mut |members, at| members[at].1 = Node::Null);
        let accepted = read(written(&null).as_bytes()).is_some();
        assert_eq!(accepted, field.presence == Presence::Optional, "{} is null", field.key);
    }
}

/// Every value of every other type under every key: the reader and the description agree.
#[test]
fn describes_what_stands_under_each_key() {
    let values = values();
    let mut words = BTreeSet::new();
    for (place, field) in keys() {
        for value in &values {
            let mut changed = full_tree();
            change(&mut changed, &place, &mut |members, at| members[at].1 = value.clone());
            agree(written(&changed).as_bytes());
        }
        let list = match field.value {
            Value::Word(list) => list.to_vec(),
            Value::Unit => LengthUnit::ALL.map(LengthUnit::symbol).to_vec(),
            _ => continue,
        };
        for word in list {
            let mut changed = full_tree();
            change(&mut changed, &place, &mut |members, at| members[at].1 = Node::Text(word.into()));
            assert!(read(written(&changed).as_bytes()).is_some(), "`{word}` under {}", field.key);
            words.insert(word);
        }
    }
    assert!(words.len() >= 28, "{}", words.len());
}

/// What the quick reader accepts has no fault, and what it refuses is explained.
fn agree(bytes: &[u8]) {
    let faults = explained(bytes);
    let shown = String::from_utf8_lossy(bytes);
    assert_eq!(read(bytes).is_some(), faults.is_empty(), "{faults:?} in {shown}");
    for fault in faults {
        assert!(!fault.to_string().contains(['\n', '\r']), "{fault}");
        assert!(!fault.message.is_empty() && !fault.message.ends_with('.'), "{fault}");
    }
}

/// The schema is made from the types too: it names the same keys and asks for the same ones.
#[cfg(feature = "schema")]
#[test]
fn describes_what_the_schema_describes() {
    use serde_json::Value as Json;

    fn resolved<'a>(root: &'a Json, schema: &'a Json) -> &'a Json {
        match schema.get("$ref").and_then(Json::as_str).and_then(|path| root.pointer(path.trim_start_matches('#'))) {
            Some(inner) => inner,
            None => schema,
        }
    }

    fn same(root: &Json, form: &Form, schema: &Json) {
        assert_eq!(schema["additionalProperties"], false, "{}", form.what);
        let properties = schema["properties"].as_object().unwrap();
        let described: BTreeSet<&str> = form.fields.iter().map(|field| field.key).collect();
        assert_eq!(properties.keys().map(String::as_str).collect::<BTreeSet<_>>(), described, "{}", form.what);
        let required = schema["required"].as_array().unwrap();
        let required: BTreeSet<&str> = required.iter().filter_map(Json::as_str).collect();
        let described = form.fields.iter().filter(|field| field.presence == Presence::Required);
        assert_eq!(required, described.map(|field| field.key).collect::<BTreeSet<_>>(), "{}", form.what);
        for field in form.fields {
            let property = &properties[field.key];
            match &field.value {
                Value::Object(inner) => same(root, inner, resolved(root, property)),
                Value::List(Value::Object(inner)) => same(root, inner, resolved(root, &property["items"])),
                Value::Word(words) => {
                    let schema = property["anyOf"].get(0).unwrap_or(property);
                    let schema = resolved(root, schema);
                    let listed = schema["oneOf"].as_array().unwrap();
                    let listed: BTreeSet<&str> = listed.iter().filter_map(|word| word["const"].as_str()).collect();
                    assert_eq!(listed, words.iter().copied().collect::<BTreeSet<_>>(), "{}", field.key);
                }
                _ => {}
            }
        }
    }

    let schema: Json = serde_json::from_str(&crate::layout::Layout::file_schema()).unwrap();
    same(&schema, &LAYOUT, &schema);
}

/// A file that is cut off anywhere is told to be so, with the place.
#[test]
fn a_file_cut_off_anywhere_is_told_to_be_so() {
    let text = full().to_json();
    for length in 1..text.trim_end().len() {
        let error = diagnose(&text.as_bytes()[..length]).to_string();
        assert!(error.contains("cut off at line"), "{error}");
    }
}
