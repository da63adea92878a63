//! The way through a file along the description of the format, gathering faults.

use super::form::{Field, Form, LAYOUT, Presence, Value};
use super::tree::{Node, shown};
use super::value::{self, Wrong};
use crate::error::{Fault, FaultCode, Faults, nearest};

/// The faults found so far and the place that is looked at.
#[derive(Default)]
pub(super) struct Walk<'a> {
    faults: Faults,
    place: Vec<Step<'a>>,
    /// The id of the element that is looked at.
    element: Option<&'a str>,
}

#[derive(Clone, Copy)]
enum Step<'a> {
    Key(&'a str),
    Index(usize),
}

impl<'a> Walk<'a> {
    /// Looks at a whole file.
    pub(super) fn layout(mut self, root: &'a Node<'a>) -> Faults {
        if let Node::Object(_) = root {
            let (wrong, goes_on) = value::format(root.member("format"));
            if let Some(wrong) = wrong {
                self.at("format", |walk| walk.report(wrong));
            }
            if !goes_on {
                return self.faults;
            }
        }
        self.object(&LAYOUT, root);
        self.faults
    }

    fn at(&mut self, key: &'a str, look: impl FnOnce(&mut Self)) {
        self.place.push(Step::Key(key));
        look(self);
        self.place.pop();
    }

    fn report(&mut self, wrong: Wrong) {
        let mut fault = Fault::new(wrong.code, self.path(), wrong.message);
        if let Some(element) = self.element {
            fault = fault.of(&shown(element));
        }
        if let Some(help) = wrong.help {
            fault = fault.help(help);
        }
        self.faults.push(fault);
    }

    /// The place as text: `drains[3].length`.
    fn path(&self) -> String {
        let mut path = String::new();
        for step in &self.place {
            match step {
                Step::Index(index) => path.push_str(&format!("[{index}]")),
                Step::Key(key) => {
                    if !path.is_empty() {
                        path.push('.');
                    }
                    path.push_str(&shown(key));
                }
            }
        }
        path
    }

    fn value(&mut self, expected: &Value, found: &'a Node<'a>) {
        match expected {
            Value::Object(form) => self.object(form, found),
            Value::List(item) => self.list(item, found),
            Value::Position => self.position(found),
            _ => {
                if let Err(wrong) = value::judge(expected, found) {
                    self.report(wrong);
                }
            }
        }
    }

    fn list(&mut self, item: &Value, found: &'a Node<'a>) {
        let Node::List(values) = found else {
            let expected = match item {
                Value::Object(form) => format!("a list, each item {}", form.what),
                _ => "a list".to_owned(),
            };
            let wrong = Wrong::kind(found, &expected);
            return self.report(match found {
                Node::Null => wrong.help("leave the key out, or write `[]`"),
                Node::Object(_) => wrong.help("put it in `[` and `]`"),
                _ => wrong,
            });
        };
        for (index, value) in values.iter().enumerate() {
            self.place.push(Step::Index(index));
            self.value(item, value);
            self.place.pop();
        }
    }

    fn position(&mut self, found: &'a Node<'a>) {
        match found {
            Node::List(values) if values.len() == 2 => self.list(&Value::Length, found),
            _ => self.report(Wrong::kind(found, "two distances, such as `[\"7.2 m\", \"1.1 m\"]`")),
        }
    }

    fn object(&mut self, form: &Form, found: &'a Node<'a>) {
        let Node::Object(members) = found else {
            return self.report(Wrong::kind(found, &format!("{} in `{{` and `}}`", form.what)));
        };
        let outer = self.element;
        if form.fields.iter().any(|field| field.key == "id") {
            self.element = found.member("id").and_then(Node::text).filter(|id| !id.trim().is_empty());
        }
        let known = |key: &str| form.fields.iter().position(|field| field.key == key);
        let mut absent: Vec<bool> = vec![true; form.fields.len()];
        for (key, _) in members {
            if let Some(absent) = known(key).and_then(|at| absent.get_mut(at)) {
                *absent = false;
            }
        }
        let free: Vec<&'static str> =
            form.fields.iter().zip(&absent).filter(|(_, absent)| **absent).map(|(field, _)| field.key).collect();
        let mut seen = vec![false; form.fields.len()];
        let mut meant = Vec::new();
        for (key, value) in members {
            self.at(key, |walk| match form.fields.iter().zip(&mut seen).find(|(field, _)| field.key == key) {
                Some((field, seen)) => walk.field(field, value, std::mem::replace(seen, true)),
                None => meant.extend(walk.unknown(form, key, &free)),
            });
        }
        for field in form.fields {
            let missing = field.presence == Presence::Required && free.contains(&field.key);
            // The name of the format has its own fault, and a misspelt key is reported already.
            if missing && !matches!(field.value, Value::Format) && !meant.contains(&field.key) {
                let message = format!("the key `{}` is missing in {}", field.key, form.what);
                self.at(field.key, |walk| walk.report(Wrong::new(FaultCode::MissingKey, message)));
            }
        }
        self.element = outer;
    }

    fn field(&mut self, field: &Field, value: &'a Node<'a>, earlier: bool) {
        if earlier {
            let wrong = Wrong::new(FaultCode::RepeatedKey, format!("the key `{}` stands here again", field.key));
            self.report(wrong.help("keep one of them"));
        }
        if matches!(value, Node::Null) && field.presence == Presence::Optional || matches!(field.value, Value::Format) {
            return;
        }
        self.value(&field.value, value);
    }

    /// Reports a key that the format does not have; returns the key that was meant, where it can be told.
    fn unknown(&mut self, form: &Form, key: &str, free: &[&'static str]) -> Option<&'static str> {
        let message = format!("the key `{}` is not known in {}", shown(key), form.what);
        let wrong = Wrong::new(FaultCode::UnknownKey, message);
        let plain = key.trim().replace([' ', '-'], "_");
        let near = nearest(&plain, free.iter().copied());
        self.report(match near {
            Some(near) => wrong.help(format!("did you mean `{near}`?")),
            None => {
                let keys: Vec<String> = form.fields.iter().map(|field| format!("`{}`", field.key)).collect();
                wrong.help(format!("the keys of {} are {}", form.what, keys.join(", ")))
            }
        });
        near
    }
}
