//! Why bytes are no JSON text: the line and column, what was expected, and the usual slips.

use serde_json::error::Category;

use crate::error::{Fault, FaultCode};

/// A place in a text as editors count it.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
struct Place {
    line: usize,
    column: usize,
}

impl Place {
    /// The place after `before`.
    fn after(before: &str) -> Self {
        let line = before.matches('\n').count() + 1;
        let start = before.rfind('\n').map_or(0, |at| at + 1);
        Self { line, column: before[start..].chars().count() + 1 }
    }
}

/// The text of a file, without the mark that some editors put before it.
pub(super) fn decode(bytes: &[u8]) -> Result<&str, Fault> {
    let not_utf8 = |message: String| Fault::new(FaultCode::NotUtf8, "", message).help("save the file as UTF-8");
    let zeros = bytes.iter().take(64).filter(|byte| **byte == 0).count();
    if bytes.starts_with(&[0xFF, 0xFE])
        || bytes.starts_with(&[0xFE, 0xFF])
        || zeros > 0 && zeros * 3 >= bytes.len().min(64)
    {
        return Err(not_utf8("the file is UTF-16 or UTF-32 text, expected UTF-8".to_owned()));
    }
    match std::str::from_utf8(bytes) {
        Ok(text) => Ok(text.strip_prefix('\u{feff}').unwrap_or(text)),
        Err(error) => {
            let at = error.valid_up_to();
            let valid = bytes.get(..at).and_then(|valid| std::str::from_utf8(valid).ok()).unwrap_or_default();
            let place = Place::after(valid);
            let place = format!("line {}, column {} (byte {at})", place.line, place.column);
            if error.error_len().is_none() {
                let message = format!("the file is cut off within a character at {place}");
                return Err(Fault::new(FaultCode::NotUtf8, "", message).help("copy or write the file again"));
            }
            let byte = bytes.get(at).copied().unwrap_or_default();
            Err(not_utf8(format!("the byte `0x{byte:02X}` at {place} is no UTF-8 text")))
        }
    }
}

/// The fault for a text that the JSON reader refuses.
pub(super) fn fault(text: &str, error: &serde_json::Error) -> Fault {
    if text.trim().is_empty() {
        return Fault::new(FaultCode::NotJson, "", "the file is empty, expected a layout");
    }
    let cut_off = error.classify() == Category::Eof;
    let at = if cut_off { text.len() } else { offset(text, error.line(), error.column()) };
    let place = Place::after(text.get(..at).unwrap_or(text));
    let place = format!("line {}, column {}", place.line, place.column);
    if cut_off {
        let message = format!("the file is cut off at {place}: {}", open(text));
        return Fault::new(FaultCode::NotJson, "", message).help("copy or write the file again");
    }
    let words = error.to_string();
    let words = words.rsplit_once(" at line ").map_or(words.as_str(), |(words, _)| words);
    let code = match (error.classify(), words) {
        (Category::Data, _) => FaultCode::WrongType,
        (_, "number out of range") => FaultCode::OutOfRange,
        _ => FaultCode::NotJson,
    };
    let fault = Fault::new(code, "", format!("{} at {place}", plain(words)));
    match help(text, at, words) {
        Some(help) => fault.help(help),
        None => fault,
    }
}

/// The byte at which the reader stopped. It counts columns in bytes, from 1; column 0 is the line break before.
fn offset(text: &str, line: usize, column: usize) -> usize {
    let start = match line.checked_sub(2) {
        Some(breaks) => text.match_indices('\n').nth(breaks).map_or(text.len(), |(at, _)| at + 1),
        None => 0,
    };
    let mut at = (start + column).saturating_sub(1).min(text.len());
    while !text.is_char_boundary(at) {
        at -= 1;
    }
    at
}

/// The words of the JSON reader in plain words.
fn plain(words: &str) -> String {
    let plain = match words {
        "expected value" => "the text is no JSON: a value is missing or cannot be read",
        "trailing comma" => "the text is no JSON: nothing follows the comma",
        "trailing characters" => "more text follows the end of the layout",
        "key must be a string" => "the text is no JSON: a key in double quotes is expected",
        "expected ident" => "the text is no JSON: `true`, `false` or `null` is expected",
        "invalid number" => "the text is no JSON: a number cannot be read",
        "number out of range" => "a number is too large",
        "invalid escape" => "the text is no JSON: what follows `\\` is no escape",
        "recursion limit exceeded" => "lists and objects lie in one another too deeply",
        words if words.starts_with("control character") => {
            "the text is no JSON: a line break or another control character stands in a text"
        }
        words => return format!("the text is no JSON: {words}"),
    };
    plain.to_owned()
}

/// The likely fix, from what stands where the reader stopped.
fn help(text: &str, at: usize, words: &str) -> Option<&'static str> {
    let rest = text.get(at..)?;
    let before = text.get(..at)?;
    // For words the reader stops at the first letter that is wrong.
    let word = before.rfind(|character: char| !character.is_alphanumeric()).map_or(0, |at| at + 1);
    let word: String = text.get(word..)?.chars().take_while(|character| character.is_alphanumeric()).collect();
    let here = |start: &str| rest.starts_with(start);
    Some(match words {
        "expected value" | "expected ident" | "invalid number"
            if matches!(word.as_str(), "NaN" | "nan" | "Infinity" | "inf") =>
        {
            "JSON has no such number: write a finite one, or leave the key out"
        }
        "expected value" | "expected ident"
            if matches!(word.as_str(), "True" | "False" | "None" | "TRUE" | "FALSE" | "NULL") =>
        {
            "write `true`, `false` or `null` in small letters"
        }
        "trailing comma" => "take the last comma out",
        "trailing characters" => "a file holds one layout: take out what follows its last `}`",
        "recursion limit exceeded" => "the format needs at most five levels",
        "invalid escape" => "write `\\\\` for a backslash and `\\\"` for an inch mark",
        _ if here("//") || here("/*") || here("#") => "JSON has no comments: take it out",
        _ if here("'") || here("`") || here("“") => "put keys and text in double quotes",
        "expected `,` or `}`" | "expected `,` or `]`" if here("\"") && before.trim_end().ends_with('"') => {
            "put a comma before it, or write an inch mark within text as `\\\"`"
        }
        "expected `,` or `}`" | "expected `,` or `]`" if here("\"") => "put a comma before it",
        "expected `,` or `}`" | "expected `,` or `]`" if here(",") => return None,
        "key must be a string" => "put keys in double quotes",
        words if words.starts_with("control character") => {
            "write a line break within text as `\\n`, and close each text with `\"`"
        }
        _ => return None,
    })
}

/// What is still open at the end of a text that is cut off.
fn open(text: &str) -> String {
    let (mut depth, mut quoted, mut escaped) = (0_usize, false, false);
    for byte in text.bytes() {
        match byte {
            _ if escaped => escaped = false,
            b'\\' if quoted => escaped = true,
            b'"' => quoted = !quoted,
            b'{' | b'[' if !quoted => depth += 1,
            b'}' | b']' if !quoted => depth = depth.saturating_sub(1),
            _ => {}
        }
    }
    match (quoted, depth) {
        (true, _) => "a text is not closed by `\"`".to_owned(),
        (false, 0) => "a value is missing".to_owned(),
        (false, 1) => "the last `}` or `]` is missing".to_owned(),
        (false, depth) => format!("{depth} brackets are not closed"),
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn told(text: &str) -> String {
        let error = serde_json::from_str::<serde_json::Value>(text).unwrap_err();
        fault(text, &error).to_string()
    }

    #[test]
    fn names_line_and_column_as_editors_count() {
        assert!(told("{\n  \"ä\": 1 x}").contains("line 2, column 10"), "{}", told("{\n  \"ä\": 1 x}"));
        assert!(told("{\n  \"a\": 1\n").contains("cut off at line 3, column 1"), "{}", told("{\n  \"a\": 1\n"));
        assert!(told("[1,]").contains("line 1, column 4"), "{}", told("[1,]"));
    }

    #[test]
    fn knows_the_usual_slips() {
        for (text, words) in [
            ("", "the file is empty"),
            ("{\"a\": NaN}", "JSON has no such number"),
            ("{\"a\": -Infinity}", "JSON has no such number"),
            ("{\"a\": Infinity}", "JSON has no such number"),
            ("{\"a\": True}", "in small letters"),
            ("{\"a\": None}", "in small letters"),
            ("{\"a\": 1,}", "take the last comma out"),
            ("{\"a\": 1} {}", "a file holds one layout"),
            ("{'a': 1}", "double quotes"),
            ("{a: 1}", "double quotes"),
            ("// heron\n{}", "no comments"),
            ("{\"a\": 1 // x\n}", "no comments"),
            ("{\"a\": \"3'-6 1/2\"\"}", "inch mark"),
            ("{\"a\": \"x\" \"b\": 1}", "comma"),
            ("{\"a\": \"x\ny\"}", "line break"),
            ("{\"a\": \"3\\'\"}", "backslash"),
            ("{\"a\": 1e999}", "too large"),
            ("{\"a\": [1, 2", "2 brackets are not closed"),
            ("{\"a\": \"x", "a text is not closed"),
        ] {
            assert!(told(text).contains(words), "{text}: {}", told(text));
        }
        assert!(told(&"[".repeat(200)).contains("too deeply"));
    }

    #[test]
    fn tells_other_encodings_from_utf8() {
        let wide: Vec<u8> = "{\"format\": 1}".encode_utf16().flat_map(u16::to_le_bytes).collect();
        let text = |bytes: &[u8]| decode(bytes).unwrap_err().to_string();
        assert!(text(&wide).contains("UTF-16"));
        assert!(text(&[&[0xFF, 0xFE], wide.as_slice()].concat()).contains("UTF-16"));
        assert!(text(b"{\n\"a\": \"\xE9t\xE9\"}").contains("`0xE9` at line 2, column 7 (byte 8)"));
        assert!(text("{\"é".as_bytes().get(..3).unwrap()).contains("cut off within a character"));
        assert_eq!(decode("\u{feff}{}".as_bytes()), Ok("{}"));
    }
}
