//! Lengths, slopes and sizes: read, written, reckoned with.

use std::ffi::c_char;

use dwv_core::quantity::{Length, LengthUnit, PipeSize, Slope, Written};

use crate::error::dwv_error;
use crate::guard::{Refusal, give, make};
use crate::status::dwv_status;
use crate::string::dwv_string;
use crate::text::text;

/// A size in hundredths of an inch: 150 for 1-1/2. Nominal sizes are whole quarters of an inch.
pub(crate) fn hundredths(size: PipeSize) -> u32 {
    const HUNDREDTH: i64 = 254_000;
    u32::try_from(size.nominal().nanometres() / HUNDREDTH).unwrap_or(0)
}

/// The size that has so many hundredths of an inch, when the trade lists it.
pub(crate) fn size_of(hundredths: u32, argument: &'static str) -> Result<PipeSize, Refusal> {
    let inches = format!("{}.{:02}", hundredths / 100, hundredths % 100);
    PipeSize::parse(&inches).map_err(|error| Refusal::quantity(argument, &error))
}

/// A slope as two numbers, within the bounds that the engine has for written slopes.
pub(crate) fn ratio(rise: u32, run: u32, argument: &'static str) -> Result<Written<Slope>, Refusal> {
    Slope::parse(&format!("{rise}:{run}")).map_err(|error| Refusal::quantity(argument, &error))
}

/// A length in nanometres, within the bounds that the engine has for written lengths.
fn bounded(length_nm: i64, argument: &'static str) -> Result<Length, Refusal> {
    let written = Length::from_nanometres(length_nm).in_unit(LengthUnit::Metre).to_string();
    Length::parse(&written).map(|length| length.value).map_err(|error| Refusal::quantity(argument, &error))
}

/// The fall of a length in nanometres at a slope of `rise` in `run`, to the nearest nanometre, halves away from zero.
///
/// Status: `DWV_ERROR_QUANTITY` beyond 1000 km, for a slope of none and one steeper than 1000 in 1; `DWV_ERROR_NULL`. Then `*fall_nm` is
/// not written.
///
/// # Safety
/// `fall_nm`, and `error` unless NULL, can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_fall(
    length_nm: i64,
    rise: u32,
    run: u32,
    fall_nm: *mut i64,
    error: *mut *mut dwv_error,
) -> dwv_status {
    let work = || {
        let length = bounded(length_nm, "length_nm")?;
        Ok(ratio(rise, run, "rise")?.value.fall_over(length).nanometres())
    };
    // SAFETY: the caller's contract.
    unsafe { give(fall_nm, "fall_nm", error, work) }
}

/// Reads a length with its unit, such as `3'-6 1/2"` or `1.2 m`, as nanometres.
///
/// Status: `DWV_ERROR_QUANTITY`, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`. Then `*length_nm` is not written.
///
/// # Safety
/// `written` has `length` readable bytes; `length_nm`, and `error` unless NULL, can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_length_parse(
    written: *const c_char,
    length: usize,
    length_nm: *mut i64,
    error: *mut *mut dwv_error,
) -> dwv_status {
    let work = || {
        // SAFETY: the caller's contract.
        let read = Length::parse(unsafe { text(written, length, "written") }?);
        Ok(read.map_err(|error| Refusal::quantity("written", &error))?.value.nanometres())
    };
    // SAFETY: the caller's contract.
    unsafe { give(length_nm, "length_nm", error, work) }
}

/// Writes a length as schedules show it: `m` to the millimetre, `cm`, `mm`, `ft` to 1/1000, `in` and `ft-in` to 1/16 inch. The caller
/// owns `*written`.
///
/// Status: `DWV_ERROR_QUANTITY` for another unit, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`.
///
/// # Safety
/// `unit` has `length` readable bytes; `written`, and `error` unless NULL, can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_length_text(
    length_nm: i64,
    unit: *const c_char,
    length: usize,
    written: *mut *mut dwv_string,
    error: *mut *mut dwv_error,
) -> dwv_status {
    let work = || {
        // SAFETY: the caller's contract.
        let unit = LengthUnit::parse(unsafe { text(unit, length, "unit") }?);
        let unit = unit.map_err(|error| Refusal::quantity("unit", &error))?;
        Ok(dwv_string::new(&Length::from_nanometres(length_nm).rounded(unit).to_string()))
    };
    // SAFETY: the caller's contract.
    unsafe { make(written, "written", error, work) }
}

/// A slope as rise over run, in lowest terms.
#[repr(C)]
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct dwv_slope {
    /// The rise.
    pub rise: u32,
    /// The run; never 0.
    pub run: u32,
}

/// Reads a slope, such as `1:50`, `2 %`, `1/4 in per ft` or `20 mm/m`.
///
/// Status: `DWV_ERROR_QUANTITY`, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`. Then `*slope` is not written.
///
/// # Safety
/// `written` has `length` readable bytes; `slope`, and `error` unless NULL, can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_slope_parse(
    written: *const c_char,
    length: usize,
    slope: *mut dwv_slope,
    error: *mut *mut dwv_error,
) -> dwv_status {
    let work = || {
        // SAFETY: the caller's contract.
        let read = Slope::parse(unsafe { text(written, length, "written") }?);
        let read = read.map_err(|error| Refusal::quantity("written", &error))?.value;
        Ok(dwv_slope { rise: read.rise(), run: read.run() })
    };
    // SAFETY: the caller's contract.
    unsafe { give(slope, "slope", error, work) }
}

/// Reads a nominal pipe size, such as `1-1/2`, as hundredths of an inch: 150.
///
/// Status: `DWV_ERROR_QUANTITY` for what the trade does not list, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`. Then `*size_hundredths` is not
/// written.
///
/// # Safety
/// `written` has `length` readable bytes; `size_hundredths`, and `error` unless NULL, can be written to.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn dwv_pipe_size_parse(
    written: *const c_char,
    length: usize,
    size_hundredths: *mut u32,
    error: *mut *mut dwv_error,
) -> dwv_status {
    let work = || {
        // SAFETY: the caller's contract.
        let read = PipeSize::parse(unsafe { text(written, length, "written") }?);
        read.map(hundredths).map_err(|error| Refusal::quantity("written", &error))
    };
    // SAFETY: the caller's contract.
    unsafe { give(size_hundredths, "size_hundredths", error, work) }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn every_size_is_whole_hundredths_and_reads_back() {
        for size in PipeSize::ALL {
            assert_eq!(i64::from(hundredths(size)) * 254_000, size.nominal().nanometres());
            assert_eq!(size_of(hundredths(size), "size").unwrap(), size);
        }
        assert!(size_of(201, "size").is_err() && size_of(0, "size").is_err() && size_of(u32::MAX, "size").is_err());
    }

    #[test]
    fn what_reckons_with_no_bound_is_refused() {
        assert!(bounded(i64::MAX, "length").is_err() && bounded(i64::MIN, "length").is_err());
        assert_eq!(bounded(-1, "length").unwrap().nanometres(), -1);
        assert!(ratio(0, 50, "rise").is_err() && ratio(1, 0, "rise").is_err() && ratio(u32::MAX, 1, "rise").is_err());
    }
}
