//! What this library is.

use crate::text::dwv_text;

/// The version of the binary interface: it rises when a program built for an older one could break.
///
/// A program compares it with `dwv_abi_version()` to learn whether the library that it found is the one it was built for.
pub const DWV_ABI_VERSION: u32 = 1;

/// The version of the binary interface of the library that is loaded: `DWV_ABI_VERSION` when it fits this header.
#[unsafe(no_mangle)]
pub extern "C" fn dwv_abi_version() -> u32 {
    DWV_ABI_VERSION
}

/// The version of the library that is loaded, such as `0.1.0`. The text lives as long as the program.
#[unsafe(no_mangle)]
pub extern "C" fn dwv_version() -> dwv_text {
    const TEXT: &str = concat!(env!("CARGO_PKG_VERSION"), "\0");
    dwv_text { data: TEXT.as_ptr().cast(), length: TEXT.len() - 1 }
}

/// The caution that every report carries. The text lives as long as the program.
#[unsafe(no_mangle)]
pub extern "C" fn dwv_caution() -> dwv_text {
    dwv_text::of_static(
        c"These results support, and do not replace, the local code in force, the authority having jurisdiction and a licensed practitioner.",
    )
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_caution_is_that_of_the_core() {
        // SAFETY: the text is static.
        let text = unsafe { std::ffi::CStr::from_ptr(dwv_caution().data) };
        assert_eq!(text.to_str(), Ok(dwv_core::schedule::CAUTION));
    }
}
