//! Every cell of every row that C reads is the one of the canonical result, for every shared case.
#![allow(clippy::unwrap_used)] // A row that cannot be read must fail the test.

use std::ffi::CStr;
use std::path::Path;
use std::ptr::{null, null_mut};

use dwv::*;
use serde_json::{Map, Value, json};

/// The text of a view, which must end where it says.
fn text(view: dwv_text) -> String {
    // SAFETY: the sizing that the view came from is freed last.
    let text = unsafe { CStr::from_ptr(view.data) }.to_str().unwrap();
    assert_eq!(text.len(), view.length);
    text.to_owned()
}

fn optional(view: dwv_text) -> Value {
    if view.length == 0 { Value::Null } else { text(view).into() }
}

fn size(size: dwv_pipe_size) -> Value {
    let inches = size.text.length;
    assert_eq!(inches == 0, size.hundredths == 0);
    optional(size.text)
}

fn measure(measure: dwv_measure) -> Value {
    if measure.known { json!(measure.nanometres as f64 / 1e9) } else { Value::Null }
}

fn units(thousandths: u64) -> Value {
    json!(thousandths as f64 / 1000.0)
}

fn decision(decision: dwv_decision) -> Value {
    match decision {
        dwv_decision::DWV_DECIDED => "decided",
        dwv_decision::DWV_PROVISIONAL => "provisional",
        dwv_decision::DWV_CANNOT_DECIDE => "cannot-decide",
    }
    .into()
}

/// Reads an element with a call that fills a place.
fn read<T>(call: impl FnOnce(*mut T) -> dwv_status) -> T {
    let mut place = std::mem::MaybeUninit::uninit();
    assert_eq!(call(place.as_mut_ptr()), dwv_status::DWV_OK);
    // SAFETY: the call filled the place.
    unsafe { place.assume_init() }
}

/// All elements of a list, which ends where its count says.
fn all<T>(count: usize, call: impl Fn(usize, *mut T) -> dwv_status) -> Vec<T> {
    let mut beyond = std::mem::MaybeUninit::uninit();
    assert_eq!(call(count, beyond.as_mut_ptr()), dwv_status::DWV_ERROR_INDEX);
    (0..count).map(|index| read(|place| call(index, place))).collect()
}

type ReadReason = unsafe extern "C" fn(*const dwv_sizing, usize, usize, *mut dwv_reason_row) -> dwv_status;

fn reasons(sizing: *const dwv_sizing, call: ReadReason, row: usize, count: usize) -> Value {
    // SAFETY: the sizing is there, and the place can be written to.
    let rows = all(count, |index, place| unsafe { call(sizing, row, index, place) });
    let reason = |row: dwv_reason_row| {
        assert_eq!(row.attested, !["disputed", "memory", "unsure"].contains(&text(row.witness).as_str()));
        json!({
            "rule": text(row.rule), "says": text(row.says), "asks": size(row.asks), "clause": text(row.clause),
            "witness": text(row.witness), "governs": row.governs,
        })
    };
    rows.into_iter().map(reason).collect()
}

fn pipe(sizing: *const dwv_sizing, (index, row): (usize, dwv_pipe_row)) -> Value {
    json!({
        "id": text(row.id), "name": text(row.name), "from": text(row.from), "to": text(row.to),
        "load": units(row.load_thousandths), "traps": row.traps, "water_closets": row.water_closets,
        "size": size(row.size), "status": decision(row.decision), "governed_by": text(row.governed_by),
        "clause": text(row.clause), "room": if row.room.known { units(row.room.thousandths) } else { Value::Null },
        "wet_vent": row.wet_vent, "vertical": row.vertical, "slope": optional(row.slope),
        "length_m": measure(row.length), "fall_m": measure(row.fall),
        "invert_up_m": measure(row.invert_up), "invert_down_m": measure(row.invert_down),
        "reasons": reasons(sizing, dwv_sizing_pipe_reason, index, row.reasons),
    })
}

fn vent(sizing: *const dwv_sizing, (index, row): (usize, dwv_vent_row)) -> Value {
    json!({
        "id": text(row.id), "name": text(row.name), "from": text(row.from), "to": text(row.to),
        "ends_at": text(row.ends_at), "largest_trap": size(row.largest_trap), "load": units(row.load_thousandths),
        "developed_length_m": measure(row.developed_length), "length_m": measure(row.length), "size": size(row.size),
        "status": decision(row.decision), "governed_by": text(row.governed_by), "clause": text(row.clause),
        "reasons": reasons(sizing, dwv_sizing_vent_reason, index, row.reasons),
    })
}

fn terminal(sizing: *const dwv_sizing, (index, row): (usize, dwv_terminal_row)) -> Value {
    json!({
        "id": text(row.id), "vent": text(row.vent), "through": text(row.through), "above_m": measure(row.above),
        "size": size(row.size), "status": decision(row.decision), "governed_by": text(row.governed_by),
        "clause": text(row.clause), "reasons": reasons(sizing, dwv_sizing_terminal_reason, index, row.reasons),
    })
}

fn fixture(sizing: *const dwv_sizing, (index, row): (usize, dwv_fixture_row)) -> Value {
    // SAFETY: the sizing is there, and the place can be written to.
    let air = all(row.air_steps, |step, place| unsafe { dwv_sizing_fixture_air(sizing, index, step, place) });
    json!({
        "id": text(row.id), "kind": text(row.kind), "level": text(row.level), "trap": size(row.trap),
        "outlet": size(row.outlet), "outlet_m": measure(row.outlet_length), "load": units(row.load_thousandths),
        "load_clause": text(row.load_clause), "load_witness": optional(row.load_witness), "future": row.future, "trap_arm_m": measure(row.trap_arm),
        "trap_arm_fall_m": measure(row.trap_arm_fall), "protected_by": optional(row.protected_by), "air": text(row.air),
        "air_path": air.into_iter().map(text).collect::<Vec<_>>(),
    })
}

fn finding(row: dwv_finding_row) -> Value {
    json!({
        "check": text(row.check), "severity": text(row.severity), "element": optional(row.element),
        "message": text(row.message), "remedy": text(row.remedy), "clause": text(row.clause),
    })
}

fn summary(sizing: *const dwv_sizing) -> Value {
    // SAFETY: the sizing is there, and the places can be written to.
    let row = read(|place| unsafe { dwv_sizing_summary(sizing, place) });
    // SAFETY: as above.
    let readings = all(row.readings, |index, place| unsafe { dwv_sizing_reading(sizing, index, place) });
    // SAFETY: as above.
    assert_eq!(text(unsafe { dwv_sizing_unattested(sizing) }), text(row.unattested));
    json!({
        "name": text(row.name), "edition": text(row.edition), "title": text(row.title),
        "readings": readings.into_iter().map(text).collect::<Vec<_>>(), "fixtures": row.fixtures, "drains": row.drains,
        "vents": row.vents, "load": units(row.load_thousandths), "unattested": optional(row.unattested),
        "caution": text(row.caution),
    })
}

/// The result as its rows tell it.
fn result(sizing: *const dwv_sizing) -> Value {
    // SAFETY: the sizing is there, and the places can be written to.
    let (pipes, vents, terminals, fixtures, findings) = unsafe {
        (
            all(dwv_sizing_pipe_count(sizing), |index, place| dwv_sizing_pipe(sizing, index, place)),
            all(dwv_sizing_vent_count(sizing), |index, place| dwv_sizing_vent(sizing, index, place)),
            all(dwv_sizing_terminal_count(sizing), |index, place| dwv_sizing_terminal(sizing, index, place)),
            all(dwv_sizing_fixture_count(sizing), |index, place| dwv_sizing_fixture(sizing, index, place)),
            all(dwv_sizing_finding_count(sizing), |index, place| dwv_sizing_finding(sizing, index, place)),
        )
    };
    json!({
        "format": "dwv-sizing/1",
        "summary": summary(sizing),
        "pipes": pipes.into_iter().enumerate().map(|row| pipe(sizing, row)).collect::<Vec<_>>(),
        "vents": vents.into_iter().enumerate().map(|row| vent(sizing, row)).collect::<Vec<_>>(),
        "terminals": terminals.into_iter().enumerate().map(|row| terminal(sizing, row)).collect::<Vec<_>>(),
        "fixtures": fixtures.into_iter().enumerate().map(|row| fixture(sizing, row)).collect::<Vec<_>>(),
        "findings": findings.into_iter().map(finding).collect::<Vec<_>>(),
    })
}

/// Numbers as they compare: 3 is 3.0.
fn plain(value: Value) -> Value {
    match value {
        Value::Number(number) => json!(number.as_f64()),
        Value::Array(list) => list.into_iter().map(plain).collect(),
        Value::Object(map) => map.into_iter().map(|(key, value)| (key, plain(value))).collect::<Map<_, _>>().into(),
        other => other,
    }
}

type Find = unsafe extern "C" fn(*const dwv_sizing, *const std::ffi::c_char, usize, *mut usize) -> dwv_status;

/// Every row is found by its id.
fn finds(sizing: *const dwv_sizing, rows: &Value, call: Find) {
    for (index, row) in rows.as_array().unwrap().iter().enumerate() {
        let id = row["id"].as_str().unwrap();
        // SAFETY: the sizing is there, and the place can be written to.
        assert_eq!(read(|place| unsafe { call(sizing, id.as_ptr().cast(), id.len(), place) }), index);
    }
}

#[test]
fn every_cell_is_that_of_the_canonical_result() {
    let folder = Path::new(env!("CARGO_MANIFEST_DIR")).join("../tests/cases");
    let mut count = 0;
    for entry in std::fs::read_dir(&folder).unwrap() {
        let path = entry.unwrap().path();
        let Some(name) = path.to_string_lossy().strip_suffix(".layout.json").map(str::to_owned) else { continue };
        let json = std::fs::read(&path).unwrap();
        let (mut layout, mut sizing) = (null_mut(), null_mut());
        // SAFETY: the bytes and places are there.
        unsafe {
            let status = dwv_layout_from_json(json.as_ptr().cast(), json.len(), &mut layout, null_mut());
            assert_eq!(status, dwv_status::DWV_OK, "{name}");
            assert_eq!(dwv_size(layout, null(), &mut sizing, null_mut()), dwv_status::DWV_OK, "{name}");
            dwv_layout_free(layout);
        }
        let canonical: Value = serde_json::from_slice(&std::fs::read(format!("{name}.sizing.json")).unwrap()).unwrap();
        let (read, canonical) = (plain(result(sizing)), plain(canonical));
        for (list, expected) in canonical.as_object().unwrap() {
            assert_eq!(&read[list], expected, "{name}: {list}");
        }
        assert_eq!(read.as_object().unwrap().len(), canonical.as_object().unwrap().len());
        finds(sizing, &canonical["pipes"], dwv_sizing_find_pipe);
        finds(sizing, &canonical["vents"], dwv_sizing_find_vent);
        finds(sizing, &canonical["terminals"], dwv_sizing_find_terminal);
        finds(sizing, &canonical["fixtures"], dwv_sizing_find_fixture);
        // SAFETY: the sizing is not used any more.
        unsafe { dwv_sizing_free(sizing) };
        count += 1;
    }
    let stated = std::fs::read_to_string(folder.join("count.txt")).unwrap();
    assert_eq!(count, stated.trim().parse::<usize>().unwrap());
}
