//! Why a file is no layout: every fault with its place, told to the person who wrote the file.
//!
//! Only files that the quick reader refused come here, so it may take its time: the text is looked at as UTF-8, then as
//! JSON, then value by value against the description of the format in `form`.

mod form;
mod syntax;
mod tree;
mod value;
mod walk;

use self::tree::Node;
use self::walk::Walk;
use crate::error::{Error, ErrorKind, Fault, FaultCode, Faults};

/// All faults of a file that cannot be read.
pub(super) fn diagnose(bytes: &[u8]) -> Error {
    match explain(bytes).into_result(ErrorKind::Format, ()) {
        Err(error) => error,
        Ok(()) => Error::one(ErrorKind::Format, unexplained(bytes)),
    }
}

/// What the description of the format finds wrong.
fn explain(bytes: &[u8]) -> Faults {
    let mut faults = Faults::default();
    let text = match syntax::decode(bytes) {
        Ok(text) => text,
        Err(fault) => {
            faults.push(fault);
            return faults;
        }
    };
    match serde_json::from_str::<Node<'_>>(text) {
        Ok(root) => Walk::default().layout(&root),
        Err(error) => {
            faults.push(syntax::fault(text, &error));
            faults
        }
    }
}

/// The last resort, for what the description of the format does not see: the words of the typed reader.
fn unexplained(bytes: &[u8]) -> Fault {
    match syntax::decode(bytes).map(|text| (text, serde_json::from_str::<super::Layout>(text))) {
        Ok((text, Err(error))) => syntax::fault(text, &error),
        Err(fault) => fault,
        Ok((_, Ok(_))) => {
            Fault::new(FaultCode::WrongType, "", "a list stands where an object is expected, or an object for a word")
        }
    }
}

#[cfg(test)]
mod tests;
