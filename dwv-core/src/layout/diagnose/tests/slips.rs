//! Files with slips of the hand and damaged bytes: the reader and the description agree, and nothing panics.

use proptest::prelude::*;

use super::edit::{change, values, written};
use super::full::full;
use super::{agree, full_tree, keys};

/// A slip of the hand in one object.
#[derive(Debug, Clone)]
enum Slip {
    Delete,
    Rename(String),
    Replace(usize),
    Repeat(Option<usize>),
    Add(String, usize),
}

fn slip() -> impl Strategy<Value = Slip> {
    let value = 0..values().len();
    prop_oneof![
        Just(Slip::Delete),
        "[a-z_$]{0,9}".prop_map(Slip::Rename),
        value.clone().prop_map(Slip::Replace),
        proptest::option::of(value.clone()).prop_map(Slip::Repeat),
        ("\\PC{0,9}", value).prop_map(|(key, value)| Slip::Add(key, value)),
    ]
}

fn slipped(slips: &[(usize, Slip)]) -> String {
    let (keys, values) = (keys(), values());
    let mut root = full_tree();
    for (key, slip) in slips {
        let place = &keys[key % keys.len()].0;
        change(&mut root, place, &mut |members, at| match slip {
            Slip::Delete => {
                members.remove(at);
            }
            Slip::Rename(name) => members[at].0 = name.clone().into(),
            Slip::Replace(value) => members[at].1 = values[*value].clone(),
            Slip::Repeat(value) => {
                let (key, own) = members[at].clone();
                members.push((key, value.map_or(own, |value| values[value].clone())));
            }
            Slip::Add(name, value) => members.insert(at, (name.clone().into(), values[*value].clone())),
        });
    }
    written(&root)
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(1500))]

    #[test]
    fn agrees_with_the_reader_on_files_with_slips(slips in prop::collection::vec((any::<usize>(), slip()), 1..4)) {
        agree(slipped(&slips).as_bytes());
    }

    #[test]
    fn agrees_with_the_reader_on_damaged_bytes(
        at in any::<prop::sample::Index>(),
        changes in prop::collection::vec((any::<prop::sample::Index>(), any::<u8>()), 0..4),
        cut in any::<bool>(),
    ) {
        let mut bytes = full().to_json().into_bytes();
        for (place, byte) in changes {
            let place = place.index(bytes.len());
            bytes[place] = byte;
        }
        if cut {
            bytes.truncate(at.index(bytes.len()));
        }
        agree(&bytes);
    }

    #[test]
    fn agrees_with_the_reader_on_any_bytes(bytes in prop::collection::vec(any::<u8>(), 0..80)) {
        agree(&bytes);
    }
}
