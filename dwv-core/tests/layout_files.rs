//! Reading and writing layout files: what is told of broken ones, and that what is written reads back.

#[path = "layout_files/any_layout.rs"]
mod any_layout;

use dwv_core::error::{ErrorKind, FaultCode};
use dwv_core::layout::Layout;
use dwv_core::quantity::{Length, Measure};
use proptest::prelude::*;

use any_layout::any_layout;

/// A kitchen sink that drains to the sewer through one stack.
const GOOD: &str = r#"{
  "format": "dwv-layout/1",
  "name": "Heron, kitchen",
  "edition": "npc-2015",
  "levels": [ { "id": "basement", "floor": "-2.7 m" }, { "id": "main", "floor": "0 m" } ],
  "fixtures": [ { "id": "KS", "kind": "kitchen-sink", "level": "main", "at": ["7.2 m", "1.1 m"], "trap": "1-1/2" } ],
  "joints": [ { "id": "J1", "level": "main" }, { "id": "S", "level": "basement", "height": "-0.3 m" } ],
  "drains": [
    { "id": "d1", "from": "KS", "to": "J1", "runs": "level", "length": "3'-6 1/2\"", "slope": "1:50" },
    { "id": "d2", "from": "J1", "to": "S", "runs": "vertical", "underground": false }
  ],
  "vents": [ { "id": "v1", "from": "J1", "to": "T1", "length": "6.1 m" } ],
  "terminals": [ { "id": "T1", "through": "roof" } ],
  "sewer": { "at": "S", "invert": "-3.95 m" }
}
"#;

/// A slip in the good file: what is written instead of what, and what is told of it.
struct Broken {
    slip: &'static str,
    changes: &'static [(&'static str, &'static str)],
    /// Path, code, and words that the message or its help must hold.
    faults: &'static [(&'static str, FaultCode, &'static str)],
}

#[rustfmt::skip]
const BROKEN: &[Broken] = &[
    Broken {
        slip: "a misspelt key",
        changes: &[("\"length\": \"3'", "\"lenght\": \"3'")],
        faults: &[("drains[0].lenght", FaultCode::UnknownKey, "`lenght` is not known in a drain; did you mean `length`?")],
    },
    Broken {
        slip: "a misspelt key that must be there is told once",
        changes: &[("\"runs\": \"vertical\"", "\"run\": \"vertical\"")],
        faults: &[("drains[1].run", FaultCode::UnknownKey, "did you mean `runs`?")],
    },
    Broken {
        slip: "a key of another object",
        changes: &[("\"through\": \"roof\"", "\"through\": \"roof\", \"size\": \"3\"")],
        faults: &[("terminals[0].size", FaultCode::UnknownKey, "the keys of a terminal are `id`, `through`, `level`")],
    },
    Broken {
        slip: "keys left out",
        changes: &[("\"kind\": \"kitchen-sink\", ", ""), ("\"name\": \"Heron, kitchen\",", "")],
        faults: &[
            ("fixtures[0].kind", FaultCode::MissingKey, "`kind` is missing in a fixture"),
            ("name", FaultCode::MissingKey, "`name` is missing in a layout"),
        ],
    },
    Broken {
        slip: "no format",
        changes: &[("\"format\": \"dwv-layout/1\",", "")],
        faults: &[("format", FaultCode::WrongFormat, "write `\"format\": \"dwv-layout/1\"`")],
    },
    Broken {
        slip: "a later version: the rest is not judged",
        changes: &[("dwv-layout/1", "dwv-layout/2"), ("\"sewer\"", "\"outfall\"")],
        faults: &[("format", FaultCode::WrongFormat, "`dwv-layout/2`, expected `dwv-layout/1`; this release reads version 1 only")],
    },
    Broken {
        slip: "a misspelt format: the rest is judged",
        changes: &[("dwv-layout/1", "dvw-layout/1"), ("\"sewer\"", "\"outfall\"")],
        faults: &[
            ("format", FaultCode::WrongFormat, "`dvw-layout/1`"),
            ("outfall", FaultCode::UnknownKey, "`outfall` is not known in a layout"),
            ("sewer", FaultCode::MissingKey, "`sewer` is missing"),
        ],
    },
    Broken {
        slip: "quantities that cannot be read, all at once",
        changes: &[("\"6.1 m\"", "\"6.1 cubits\""), ("\"1:50\"", "\"steep\""), ("\"1-1/2\"", "1.6"), ("\"-3.95 m\"", "\"-3,95 m\"")],
        faults: &[
            ("fixtures[0].trap", FaultCode::WrongQuantity, "`1.6`"),
            ("drains[0].slope", FaultCode::WrongQuantity, "`steep`"),
            ("vents[0].length", FaultCode::WrongQuantity, "unknown unit `cubits`"),
            ("sewer.invert", FaultCode::WrongQuantity, "decimal point"),
        ],
    },
    Broken {
        slip: "a length without its unit in a text",
        changes: &[("\"6.1 m\"", "\"6.1\"")],
        faults: &[("vents[0].length", FaultCode::WrongQuantity, "`6.1` has no unit")],
    },
    Broken {
        slip: "a length beyond reason",
        changes: &[("\"6.1 m\"", "\"6100000000 m\"")],
        faults: &[("vents[0].length", FaultCode::OutOfRange, "out of range")],
    },
    Broken {
        slip: "other types",
        changes: &[
            ("\"level\": \"main\", \"at\"", "\"level\": 1, \"at\""),
            ("[\"7.2 m\", \"1.1 m\"]", "\"7.2 m, 1.1 m\""),
            ("\"underground\": false", "\"underground\": \"no\""),
            ("\"length\": \"6.1 m\"", "\"length\": [6.1]"),
        ],
        faults: &[
            ("fixtures[0].level", FaultCode::WrongType, "the number `1` stands here, expected an id"),
            ("fixtures[0].at", FaultCode::WrongType, "the text `7.2 m, 1.1 m` stands here, expected two distances"),
            ("drains[1].underground", FaultCode::WrongType, "the text `no` stands here, expected `true` or `false`"),
            ("vents[0].length", FaultCode::WrongType, "a list of 1 stands here, expected a length"),
        ],
    },
    Broken {
        slip: "null where something must be",
        changes: &[("\"floor\": \"0 m\"", "\"floor\": null"), ("[ { \"id\": \"T1\", \"through\": \"roof\" } ]", "null")],
        faults: &[
            ("levels[1].floor", FaultCode::WrongType, "`null` stands here"),
            ("terminals", FaultCode::WrongType, "leave the key out, or write `[]`"),
        ],
    },
    Broken {
        slip: "an object where a list is expected, and the other way round",
        changes: &[
            ("[ { \"id\": \"T1\", \"through\": \"roof\" } ]", "{ \"id\": \"T1\", \"through\": \"roof\" }"),
            ("{ \"id\": \"main\", \"floor\": \"0 m\" }", "[ \"main\", \"0 m\" ]"),
        ],
        faults: &[
            ("levels[1]", FaultCode::WrongType, "a list of 2 stands here, expected a level in `{` and `}`"),
            ("terminals", FaultCode::WrongType, "put it in `[` and `]`"),
        ],
    },
    Broken {
        slip: "words that are not known",
        changes: &[("\"level\", \"length\"", "\"Levle\", \"length\""), ("\"roof\"", "\"chimney\"")],
        faults: &[
            ("drains[0].runs", FaultCode::UnknownWord, "expected one of `level`, `vertical`, `sloped`; did you mean `level`?"),
            ("terminals[0].through", FaultCode::UnknownWord, "`chimney` is not known here, expected one of `roof`, `wall`"),
        ],
    },
    Broken {
        slip: "a unit that is not known",
        changes: &[("\"levels\"", "\"units\": \"yd\", \"levels\"")],
        faults: &[("units", FaultCode::UnknownWord, "expected one of `m`, `cm`, `mm`, `ft`, `in`, `ft-in`")],
    },
    Broken {
        slip: "a key twice",
        changes: &[("\"runs\": \"level\"", "\"runs\": \"level\", \"to\": \"S\"")],
        faults: &[("drains[0].to", FaultCode::RepeatedKey, "`to` stands here again; keep one of them")],
    },
    Broken {
        slip: "ids that are none, beside another fault",
        changes: &[("\"id\": \"T1\"", "\"id\": \"\""), ("\"at\": \"S\"", "\"at\": \"S\\n\""), ("\"roof\"", "7")],
        faults: &[
            ("terminals[0].id", FaultCode::BadId, "the id is empty"),
            ("terminals[0].through", FaultCode::WrongType, "the number `7`"),
            ("sewer.at", FaultCode::BadId, "`S\\n` holds a control character"),
        ],
    },
    Broken {
        slip: "an inch mark that ends the text",
        changes: &[("3'-6 1/2\\\"", "3'-6 1/2\"")],
        faults: &[("", FaultCode::NotJson, "line 9, column 82; put a comma before it, or write an inch mark within text as `\\\"`")],
    },
    Broken {
        slip: "no number",
        changes: &[("\"6.1 m\"", "NaN")],
        faults: &[("", FaultCode::NotJson, "JSON has no such number")],
    },
    Broken {
        slip: "a comment",
        changes: &[("\"vents\"", "// to the roof\n  \"vents\"")],
        faults: &[("", FaultCode::NotJson, "line 12, column 3; JSON has no comments")],
    },
    Broken {
        slip: "a comma too many",
        changes: &[("\"-3.95 m\" }", "\"-3.95 m\", }")],
        faults: &[("", FaultCode::NotJson, "take the last comma out")],
    },
    Broken {
        slip: "cut off",
        changes: &[(" }\n}\n", "")],
        faults: &[("", FaultCode::NotJson, "the file is cut off at line 14, column 44: 2 brackets are not closed")],
    },
    Broken {
        slip: "two layouts",
        changes: &[(" }\n}\n", " }\n}\n{}\n")],
        faults: &[("", FaultCode::NotJson, "line 16, column 1; a file holds one layout")],
    },
];

#[test]
fn tells_what_is_wrong_with_broken_files() {
    assert!(Layout::from_json(GOOD.as_bytes()).is_ok());
    for Broken { slip, changes, faults } in BROKEN {
        let mut text = GOOD.to_owned();
        for (from, to) in *changes {
            assert_eq!(text.matches(from).count(), 1, "{slip}: `{from}`");
            text = text.replace(from, to);
        }
        let Err(error) = Layout::from_json(text.as_bytes()) else { panic!("{slip}: is accepted") };
        assert_eq!(error.kind(), ErrorKind::Format, "{slip}");
        let told: Vec<_> = error.faults().iter().map(|fault| (fault.path.as_str(), fault.code)).collect();
        let expected: Vec<_> = faults.iter().map(|(path, code, _)| (*path, *code)).collect();
        assert_eq!(told, expected, "{slip}\n{error}");
        for (fault, (_, _, words)) in error.faults().iter().zip(*faults) {
            assert!(fault.to_string().contains(words), "{slip}: `{words}` in\n{fault}");
        }
    }
}

#[test]
fn names_the_element_of_a_fault() {
    let text = GOOD.replace("\"6.1 m\"", "\"high\"");
    let error = Layout::from_json(text.as_bytes()).unwrap_err();
    assert_eq!(error.faults()[0].element.as_deref(), Some("v1"));
    assert!(error.to_string().starts_with("vents[0].length: `v1`: cannot read `high` as a length"), "{error}");
}

#[test]
fn tells_of_bytes_that_are_no_text() {
    let told = |bytes: &[u8]| {
        let error = Layout::from_json(bytes).unwrap_err();
        (error.faults()[0].code, error.to_string())
    };
    let (code, text) =
        told(&GOOD.replace("Heron", "H\u{e9}ron").chars().map(|letter| letter as u8).collect::<Vec<_>>());
    assert_eq!(code, FaultCode::NotUtf8);
    assert!(text.contains("the byte `0xE9` at line 3, column 13"), "{text}");
    let (code, text) = told(&GOOD.encode_utf16().flat_map(u16::to_le_bytes).collect::<Vec<_>>());
    assert_eq!(code, FaultCode::NotUtf8);
    assert!(text.contains("UTF-16") && text.contains("save the file as UTF-8"), "{text}");
    assert_eq!(told(b"").0, FaultCode::NotJson);
    assert_eq!(told(b"[]").0, FaultCode::WrongType);
    assert!(told("[".repeat(100_000).as_bytes()).1.contains("too deeply"));
}

#[test]
fn lists_a_hundred_faults_and_counts_the_rest() {
    let joints = vec!["{}"; 1000].join(",");
    let text = GOOD.replace("\"joints\": [", &format!("\"joints\": [ {joints},"));
    let error = Layout::from_json(text.as_bytes()).unwrap_err();
    assert_eq!((error.faults().len(), error.total()), (100, 2000));
}

#[test]
fn keeps_quantities_as_they_were_typed() {
    let layout = Layout::from_json(GOOD.as_bytes()).unwrap();
    let Some(Measure::Written(length)) = layout.drains[0].length else { panic!("{:?}", layout.drains[0]) };
    // 42-1/2 in of 25.4 mm.
    assert_eq!((length.value, length.to_string()), (Length::from_nanometres(1_079_500_000), "3'-6 1/2\"".to_owned()));
    let text = layout.to_json();
    for typed in [r#""3'-6 1/2\"""#, "\"-3.95 m\"", "\"1:50\"", "\"1-1/2\"", "[\"7.2 m\", \"1.1 m\"]"] {
        assert!(text.contains(typed), "{typed} in {text}");
    }
}

#[test]
fn takes_a_byte_order_mark_a_schema_and_null_for_what_is_not_stated() {
    let text = GOOD.replacen('{', "\u{feff}{ \"$schema\": \"dwv-layout-1.schema.json\", \"units\": null,", 1);
    let layout = Layout::from_json(text.as_bytes()).unwrap();
    assert_eq!((layout.schema.as_deref(), layout.units), (Some("dwv-layout-1.schema.json"), None));
    assert!(layout.to_json().starts_with("{\n  \"$schema\": \"dwv-layout-1.schema.json\",\n  \"format\""));
}

proptest! {
    #[test]
    fn what_is_written_reads_back(layout in any_layout()) {
        let text = layout.to_json();
        prop_assert!(text.ends_with("}\n"), "{}", text);
        let again = Layout::from_json(text.as_bytes());
        prop_assert_eq!(again.as_ref(), Ok(&layout), "{}", text);
        // Written again it is the same to the byte.
        prop_assert_eq!(again.map(|layout| layout.to_json()), Ok(text));
    }
}
