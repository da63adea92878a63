/* The C face of dwv: names, loads, sizes and grades of building drainage, waste and vent piping.
 *
 * Results support, and do not replace, the local code in force, the authority having jurisdiction and a licensed practitioner.
 *
 * Generated from dwv-capi; do not edit. What holds for every function:
 *
 * - Handles are opaque. Whoever receives one through a `dwv_thing **` owns it and frees it with `dwv_thing_free`, which accepts NULL.
 *   When a call is refused, the handle is NULL.
 * - A function that can fail returns a dwv_status and takes its outputs last. Each says below which status it gives; any may give
 *   DWV_ERROR_INTERNAL, after which every handle is as good as before.
 * - `error` may be NULL. When it is not, it receives an object with all faults, which the caller frees, or NULL on DWV_OK. It is not
 *   read, so free the last one before the next call.
 * - Texts that go in are UTF-8 of a stated length and need no zero byte. Texts that come out are views that end with a zero byte and
 *   live as long as the object that they came from.
 * - Handles never change, and there is no global state: any thread may call any function, many may read one handle at once, and one
 *   frees it when no other uses it any more. */

#ifndef DWV_H
#define DWV_H

#include <stdbool.h>
#include <stddef.h>
#include <stdint.h>

/* The version that this header belongs to; `dwv_version()` gives that of the library. */
#define DWV_VERSION "0.1.0"
#define DWV_VERSION_MAJOR 0
#define DWV_VERSION_MINOR 1
#define DWV_VERSION_PATCH 0

/*
 The version of the binary interface: it rises when a program built for an older one could break.

 A program compares it with `dwv_abi_version()` to learn whether the library that it found is the one it was built for.
 */
#define DWV_ABI_VERSION 1

/*
 What a call came back with. Values never change; new ones may be added.
 */
typedef enum {
  /*
   The call has done its work.
   */
  DWV_OK = 0,
  /*
   The bytes are no layout file.
   */
  DWV_ERROR_FORMAT = 1,
  /*
   The drawing is no drainage system.
   */
  DWV_ERROR_DRAWING = 2,
  /*
   A quantity cannot be read or is out of range.
   */
  DWV_ERROR_QUANTITY = 3,
  /*
   The edition is not known.
   */
  DWV_ERROR_EDITION = 4,
  /*
   Nothing has the id, kind or name that was asked for, or the edition gives no such value.
   */
  DWV_ERROR_QUESTION = 5,
  /*
   A pointer that must not be NULL is NULL.
   */
  DWV_ERROR_NULL = 6,
  /*
   An index is not below the count.
   */
  DWV_ERROR_INDEX = 7,
  /*
   A text is not UTF-8.
   */
  DWV_ERROR_TEXT = 8,
  /*
   A fault of this library: please report it.
   */
  DWV_ERROR_INTERNAL = 9,
} dwv_status;

/*
 How far a size is decided.
 */
typedef enum {
  /*
   Decided by values that were seen in print, by practice or by the drawing.
   */
  DWV_DECIDED = 0,
  /*
   A value that nobody has seen in print bears on it.
   */
  DWV_PROVISIONAL = 1,
  /*
   Something is missing, the tables end, or unattested values are refused.
   */
  DWV_CANNOT_DECIDE = 2,
} dwv_decision;

/*
 What is done with a size that rests on a value which nobody has seen in print.
 */
typedef enum {
  /*
   The size is given and marked.
   */
  DWV_UNATTESTED_TELL = 0,
  /*
   No size is given.
   */
  DWV_UNATTESTED_REFUSE = 1,
} dwv_unattested;

/*
 What a drain does.
 */
typedef enum {
  /*
   A branch or fixture drain.
   */
  DWV_BRANCH = 0,
  /*
   A stack, by its load in all.
   */
  DWV_STACK = 1,
  /*
   A stack, by the load of one storey.
   */
  DWV_STACK_STOREY = 2,
  /*
   A building drain or sewer.
   */
  DWV_BUILDING_DRAIN = 3,
} dwv_drain_role;

/*
 An answer with its source. Free it with `dwv_answer_free`.
 */
typedef struct dwv_answer dwv_answer;

/*
 A code edition. It is never changed, so that several threads may read it. Free it with `dwv_edition_free`.
 */
typedef struct dwv_edition dwv_edition;

/*
 Why a call was refused, with all faults of the input. Free it with `dwv_error_free`.
 */
typedef struct dwv_error dwv_error;

/*
 A drawn drainage and vent system. It is never changed, so that several threads may read it. Free it with `dwv_layout_free`.
 */
typedef struct dwv_layout dwv_layout;

/*
 A sized layout. It is never changed, so that several threads may read it. Free it with `dwv_sizing_free`.
 */
typedef struct dwv_sizing dwv_sizing;

/*
 A text that the caller owns. Free it with `dwv_string_free`.
 */
typedef struct dwv_string dwv_string;

/*
 A view of UTF-8 text. It ends with a zero byte that `length` does not count, and lives as long as the object that it came from.
 */
typedef struct {
  /*
   The first byte; never NULL.
   */
  const char *data;
  /*
   The number of bytes.
   */
  size_t length;
} dwv_text;

/*
 One fault: where it is, what it is and how to mend it. Texts live until the error is freed; those that do not apply are empty.
 */
typedef struct {
  /*
   Its stable name, such as `unknown-id`.
   */
  dwv_text code;
  /*
   Where in the layout: `drains[3].to`; for a wrong argument, its name.
   */
  dwv_text path;
  /*
   The id of the element.
   */
  dwv_text element;
  /*
   What was found and what was expected.
   */
  dwv_text message;
  /*
   The likely fix.
   */
  dwv_text help;
} dwv_fault;

/*
 A slope as rise over run, in lowest terms.
 */
typedef struct {
  /*
   The rise.
   */
  uint32_t rise;
  /*
   The run; never 0.
   */
  uint32_t run;
} dwv_slope;

/*
 Something that breaks the code, or that cannot be decided.
 */
typedef struct {
  /*
   The stable name of the check.
   */
  dwv_text check;
  /*
   `violation`, `cannot-decide` or `caution`.
   */
  dwv_text severity;
  /*
   The id of the element; empty for the whole drawing.
   */
  dwv_text element;
  /*
   What was found.
   */
  dwv_text message;
  /*
   How to mend it.
   */
  dwv_text remedy;
  /*
   The clause.
   */
  dwv_text clause;
} dwv_finding_row;

/*
 A nominal pipe size.
 */
typedef struct {
  /*
   The size in hundredths of an inch: 150 for 1-1/2; 0 when there is none or it cannot be decided.
   */
  uint32_t hundredths;
  /*
   The size as the trade writes it: `1-1/2`; empty when there is none or it cannot be decided.
   */
  dwv_text text;
} dwv_pipe_size;

/*
 A length or elevation in nanometres, when it is known.
 */
typedef struct {
  /*
   Whether it is known.
   */
  bool known;
  /*
   The value in nanometres; 0 when not known.
   */
  int64_t nanometres;
} dwv_measure;

/*
 A fixture.
 */
typedef struct {
  /*
   The id in the drawing.
   */
  dwv_text id;
  /*
   Its kind in words.
   */
  dwv_text kind;
  /*
   Its level.
   */
  dwv_text level;
  /*
   Its trap.
   */
  dwv_pipe_size trap;
  /*
   The least size of its outlet pipe; none when the edition does not list it.
   */
  dwv_pipe_size outlet;
  /*
   The length of its outlet pipe, when stated.
   */
  dwv_measure outlet_length;
  /*
   Its load in thousandths of a fixture unit.
   */
  uint64_t load_thousandths;
  /*
   Where the load comes from.
   */
  dwv_text load_clause;
  /*
   How sure the load is, as `witness` of `dwv_reason_row`; empty when the drawing states it.
   */
  dwv_text load_witness;
  /*
   Whether it is only provided for.
   */
  bool future;
  /*
   The developed length of the trap arm; not known when no air reaches it or a length is missing.
   */
  dwv_measure trap_arm;
  /*
   How far the trap arm falls.
   */
  dwv_measure trap_arm_fall;
  /*
   The vent that protects it; empty when it has none.
   */
  dwv_text protected_by;
  /*
   How it gets its air, in words.
   */
  dwv_text air;
  /*
   How many steps the way of its air has, for `dwv_sizing_fixture_air`.
   */
  size_t air_steps;
} dwv_fixture_row;

/*
 A load in thousandths of a fixture unit, when there is one.
 */
typedef struct {
  /*
   Whether there is one.
   */
  bool known;
  /*
   The value in thousandths of a fixture unit; 0 when there is none.
   */
  uint64_t thousandths;
} dwv_load;

/*
 A drain, from the sewer upstream.
 */
typedef struct {
  /*
   The id in the drawing.
   */
  dwv_text id;
  /*
   What it is called.
   */
  dwv_text name;
  /*
   Where it begins.
   */
  dwv_text from;
  /*
   Where it ends.
   */
  dwv_text to;
  /*
   The load in thousandths of a fixture unit.
   */
  uint64_t load_thousandths;
  /*
   The traps upstream.
   */
  uint32_t traps;
  /*
   The water closets upstream.
   */
  uint32_t water_closets;
  /*
   The size.
   */
  dwv_pipe_size size;
  /*
   How far the size is decided.
   */
  dwv_decision decision;
  /*
   What governs the size, in words.
   */
  dwv_text governed_by;
  /*
   The clause that governs the size.
   */
  dwv_text clause;
  /*
   The load that it could still take before a table asks for more; none where no load table bears on it.
   */
  dwv_load room;
  /*
   Whether it serves as a wet vent.
   */
  bool wet_vent;
  /*
   Whether it runs vertically.
   */
  bool vertical;
  /*
   The slope as it was written, or as a ratio; empty where there is none. `dwv_slope_parse` reads it.
   */
  dwv_text slope;
  /*
   The developed length.
   */
  dwv_measure length;
  /*
   The fall.
   */
  dwv_measure fall;
  /*
   The invert at the upper end.
   */
  dwv_measure invert_up;
  /*
   The invert at the lower end.
   */
  dwv_measure invert_down;
  /*
   How many reasons there are, for `dwv_sizing_pipe_reason`.
   */
  size_t reasons;
} dwv_pipe_row;

/*
 One minimum of a size.
 */
typedef struct {
  /*
   The stable name of the rule.
   */
  dwv_text rule;
  /*
   What it says.
   */
  dwv_text says;
  /*
   The size that it asks for.
   */
  dwv_pipe_size asks;
  /*
   The clause with the edition.
   */
  dwv_text clause;
  /*
   How sure the value is: `printed-two`, `printed-one`, `printed-provincial`, `common-practice`, `engine`, `disputed`, `memory`
   or `unsure`.
   */
  dwv_text witness;
  /*
   Whether somebody has seen the value in print, or it is practice or a parameter of the engine.
   */
  bool attested;
  /*
   Whether it governs.
   */
  bool governs;
} dwv_reason_row;

/*
 What was sized, by which edition and readings, and how sure it is.
 */
typedef struct {
  /*
   What the drawing is called.
   */
  dwv_text name;
  /*
   The id of the edition.
   */
  dwv_text edition;
  /*
   The title of the edition.
   */
  dwv_text title;
  /*
   How many readings of the edition are in force, for `dwv_sizing_reading`.
   */
  size_t readings;
  /*
   How many fixtures there are.
   */
  size_t fixtures;
  /*
   How many drains.
   */
  size_t drains;
  /*
   How many vents.
   */
  size_t vents;
  /*
   The load at the sewer in thousandths of a fixture unit.
   */
  uint64_t load_thousandths;
  /*
   One line on the sizes that rest on values which nobody has seen in print; empty when there is none.
   */
  dwv_text unattested;
  /*
   The caution that every report carries.
   */
  dwv_text caution;
} dwv_summary;

/*
 Where a vent ends in open air.
 */
typedef struct {
  /*
   The id in the drawing.
   */
  dwv_text id;
  /*
   The vent that ends here.
   */
  dwv_text vent;
  /*
   `roof` or `wall`.
   */
  dwv_text through;
  /*
   How far it ends above the roof or the ground.
   */
  dwv_measure above;
  /*
   The size where it passes to open air.
   */
  dwv_pipe_size size;
  /*
   How far the size is decided.
   */
  dwv_decision decision;
  /*
   What governs the size, in words.
   */
  dwv_text governed_by;
  /*
   The clause that governs the size.
   */
  dwv_text clause;
  /*
   How many reasons there are, for `dwv_sizing_terminal_reason`.
   */
  size_t reasons;
} dwv_terminal_row;

/*
 A vent, from open air inward.
 */
typedef struct {
  /*
   The id in the drawing.
   */
  dwv_text id;
  /*
   What it is called.
   */
  dwv_text name;
  /*
   Where it begins.
   */
  dwv_text from;
  /*
   Where it ends.
   */
  dwv_text to;
  /*
   The terminal or valve that its air comes from.
   */
  dwv_text ends_at;
  /*
   The largest trap that gets its air here.
   */
  dwv_pipe_size largest_trap;
  /*
   The load that it is sized by, in thousandths of a fixture unit.
   */
  uint64_t load_thousandths;
  /*
   The developed length that it is sized by; not known where length does not count.
   */
  dwv_measure developed_length;
  /*
   Its own length.
   */
  dwv_measure length;
  /*
   The size.
   */
  dwv_pipe_size size;
  /*
   How far the size is decided.
   */
  dwv_decision decision;
  /*
   What governs the size, in words.
   */
  dwv_text governed_by;
  /*
   The clause that governs the size.
   */
  dwv_text clause;
  /*
   How many reasons there are, for `dwv_sizing_vent_reason`.
   */
  size_t reasons;
} dwv_vent_row;

/*
 How to size. Set all bytes to zero for the defaults.
 */
typedef struct {
  /*
   The id of an edition, ending with a zero byte; NULL for the edition that the layout names.
   */
  const char *edition;
  /*
   One of `dwv_unattested`.
   */
  int32_t unattested;
} dwv_size_options;

#ifdef __cplusplus
extern "C" {
#endif // __cplusplus

/*
 Answers a question written as JSON, such as `{"ask": "vent-for-trap", "trap": "2"}`. The caller owns `*answer`, which does not need
 the edition any more.

 Status: `DWV_ERROR_QUESTION` when it is no question or asks for a kind or rule that the edition does not have, `DWV_ERROR_TEXT`,
 `DWV_ERROR_NULL`.

 Required of the caller:
 `edition` came from this library and was not freed; `question` has `length` readable bytes; `answer`, and `error` unless NULL, can be
 written to.
 */
dwv_status dwv_edition_answer(const dwv_edition *edition,
                              const char *question,
                              size_t length,
                              dwv_answer **answer,
                              dwv_error **error);

/*
 The answer itself: `6`, `1.8 m`, `1:50`, `not permitted`, `not limited`, `not known`, `beyond the table`. It lives until the answer is
 freed. NULL gives an empty text.

 Required of the caller:
 `answer` is NULL or came from this library and was not freed.
 */
dwv_text dwv_answer_text(const dwv_answer *answer);

/*
 The clause of an answer. It lives until the answer is freed. NULL gives an empty text.

 Required of the caller:
 `answer` is NULL or came from this library and was not freed.
 */
dwv_text dwv_answer_clause(const dwv_answer *answer);

/*
 How sure an answer is, as `witness` of `dwv_reason_row`. It lives until the answer is freed. NULL gives an empty text.

 Required of the caller:
 `answer` is NULL or came from this library and was not freed.
 */
dwv_text dwv_answer_witness(const dwv_answer *answer);

/*
 Whether somebody has seen the value of an answer in print, or it is practice or a parameter of the engine. NULL gives false.

 Required of the caller:
 `answer` is NULL or came from this library and was not freed.
 */
bool dwv_answer_is_attested(const dwv_answer *answer);

/*
 Frees an answer with its texts. NULL is accepted.

 Required of the caller:
 `answer` is NULL or came from this library and was not freed.
 */
void dwv_answer_free(dwv_answer *answer);

/*
 The ids of the editions that come with the library, one a line. The caller owns `*ids`.

 Status: `DWV_ERROR_NULL`.

 Required of the caller:
 `ids`, and `error` unless NULL, can be written to.
 */
dwv_status dwv_edition_ids(dwv_string **ids, dwv_error **error);

/*
 Opens an edition by its id, such as `npc-2015`. The caller owns `*edition`.

 Status: `DWV_ERROR_EDITION` with the nearest id, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`.

 Required of the caller:
 `id` has `length` readable bytes; `edition`, and `error` unless NULL, can be written to.
 */
dwv_status dwv_edition_open(const char *id, size_t length, dwv_edition **edition, dwv_error **error);

/*
 The title of an edition in full. It lives until the edition is freed. NULL gives an empty text.

 Required of the caller:
 `edition` is NULL or came from this library and was not freed.
 */
dwv_text dwv_edition_title(const dwv_edition *edition);

/*
 How many kinds of fixtures an edition lists. NULL lists none.

 Required of the caller:
 `edition` is NULL or came from this library and was not freed.
 */
size_t dwv_edition_fixture_kind_count(const dwv_edition *edition);

/*
 The word of a kind of fixture in layout files, in the order of the fixture table. `*kind` lives until the edition is freed.

 Status: `DWV_ERROR_INDEX` when `index` is not below the count, `DWV_ERROR_NULL`.

 Required of the caller:
 `edition` is NULL or came from this library and was not freed; `kind` is NULL or can be written to.
 */
dwv_status dwv_edition_fixture_kind(const dwv_edition *edition,
                                    size_t index,
                                    dwv_text *kind);

/*
 Where every value of an edition comes from, as a page in Markdown. The caller owns `*page`.

 Status: `DWV_ERROR_NULL`.

 Required of the caller:
 `edition` came from this library and was not freed; `page`, and `error` unless NULL, can be written to.
 */
dwv_status dwv_edition_provenance(const dwv_edition *edition, dwv_string **page, dwv_error **error);

/*
 Frees an edition with its texts. NULL is accepted.

 Required of the caller:
 `edition` is NULL or came from this library and was not freed.
 */
void dwv_edition_free(dwv_edition *edition);

/*
 The status of an error; `DWV_OK` for NULL.

 Required of the caller:
 `error` is NULL or came from this library and was not freed.
 */
dwv_status dwv_error_status(const dwv_error *error);

/*
 The whole message with all faults, a line each. It lives until the error is freed. NULL gives an empty text.

 Required of the caller:
 `error` is NULL or came from this library and was not freed.
 */
dwv_text dwv_error_message(const dwv_error *error);

/*
 How many faults the error lists. NULL has none.

 Required of the caller:
 `error` is NULL or came from this library and was not freed.
 */
size_t dwv_error_fault_count(const dwv_error *error);

/*
 How many faults there are with those that are not listed. NULL has none.

 Required of the caller:
 `error` is NULL or came from this library and was not freed.
 */
size_t dwv_error_fault_total(const dwv_error *error);

/*
 Copies one fault of an error to `*fault`.

 Status: `DWV_ERROR_INDEX` when `index` is not below the count, `DWV_ERROR_NULL`.

 Required of the caller:
 `error` is NULL or came from this library and was not freed; `fault` is NULL or can be written to.
 */
dwv_status dwv_error_fault(const dwv_error *error, size_t index, dwv_fault *fault);

/*
 Frees an error. NULL is accepted.

 Required of the caller:
 `error` is NULL or came from this library and was not freed.
 */
void dwv_error_free(dwv_error *error);

/*
 Reads a layout file of the format `dwv-layout/1`. The caller owns `*layout`; the bytes are not needed any more.

 Status: `DWV_ERROR_FORMAT` with all faults of the file, `DWV_ERROR_NULL`.

 Required of the caller:
 `json` has `length` readable bytes; `layout`, and `error` unless NULL, can be written to.
 */
dwv_status dwv_layout_from_json(const char *json,
                                size_t length,
                                dwv_layout **layout,
                                dwv_error **error);

/*
 Writes a layout as a file of the format `dwv-layout/1`, one element a line. The caller owns `*json`.

 Status: `DWV_ERROR_NULL`.

 Required of the caller:
 `layout` came from this library and was not freed; `json`, and `error` unless NULL, can be written to.
 */
dwv_status dwv_layout_to_json(const dwv_layout *layout, dwv_string **json, dwv_error **error);

/*
 Frees a layout. NULL is accepted.

 Required of the caller:
 `layout` is NULL or came from this library and was not freed.
 */
void dwv_layout_free(dwv_layout *layout);

/*
 The fall of a length in nanometres at a slope of `rise` in `run`, to the nearest nanometre, halves away from zero.

 Status: `DWV_ERROR_QUANTITY` beyond 1000 km, for a slope of none and one steeper than 1000 in 1; `DWV_ERROR_NULL`. Then `*fall_nm` is
 not written.

 Required of the caller:
 `fall_nm`, and `error` unless NULL, can be written to.
 */
dwv_status dwv_fall(int64_t length_nm,
                    uint32_t rise,
                    uint32_t run,
                    int64_t *fall_nm,
                    dwv_error **error);

/*
 Reads a length with its unit, such as `3'-6 1/2"` or `1.2 m`, as nanometres.

 Status: `DWV_ERROR_QUANTITY`, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`. Then `*length_nm` is not written.

 Required of the caller:
 `written` has `length` readable bytes; `length_nm`, and `error` unless NULL, can be written to.
 */
dwv_status dwv_length_parse(const char *written, size_t length, int64_t *length_nm, dwv_error **error);

/*
 Writes a length as schedules show it: `m` to the millimetre, `cm`, `mm`, `ft` to 1/1000, `in` and `ft-in` to 1/16 inch. The caller
 owns `*written`.

 Status: `DWV_ERROR_QUANTITY` for another unit, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`.

 Required of the caller:
 `unit` has `length` readable bytes; `written`, and `error` unless NULL, can be written to.
 */
dwv_status dwv_length_text(int64_t length_nm,
                           const char *unit,
                           size_t length,
                           dwv_string **written,
                           dwv_error **error);

/*
 Reads a slope, such as `1:50`, `2 %`, `1/4 in per ft` or `20 mm/m`.

 Status: `DWV_ERROR_QUANTITY`, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`. Then `*slope` is not written.

 Required of the caller:
 `written` has `length` readable bytes; `slope`, and `error` unless NULL, can be written to.
 */
dwv_status dwv_slope_parse(const char *written, size_t length, dwv_slope *slope, dwv_error **error);

/*
 Reads a nominal pipe size, such as `1-1/2`, as hundredths of an inch: 150.

 Status: `DWV_ERROR_QUANTITY` for what the trade does not list, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`. Then `*size_hundredths` is not
 written.

 Required of the caller:
 `written` has `length` readable bytes; `size_hundredths`, and `error` unless NULL, can be written to.
 */
dwv_status dwv_pipe_size_parse(const char *written,
                               size_t length,
                               uint32_t *size_hundredths,
                               dwv_error **error);

/*
 How many findings there are. NULL has none.

 Required of the caller:
 `sizing` is NULL or came from this library and was not freed.
 */
size_t dwv_sizing_finding_count(const dwv_sizing *sizing);

/*
 Copies a finding row to `*row`.

 Status: `DWV_ERROR_INDEX` when `index` is not below the count, `DWV_ERROR_NULL`. Then `*row` is not written.

 Required of the caller:
 `sizing` is NULL or came from this library and was not freed; `row` is NULL or can be written to.
 */
dwv_status dwv_sizing_finding(const dwv_sizing *sizing, size_t index, dwv_finding_row *row);

/*
 How many fixtures there are. NULL has none.

 Required of the caller:
 `sizing` is NULL or came from this library and was not freed.
 */
size_t dwv_sizing_fixture_count(const dwv_sizing *sizing);

/*
 Copies a fixture row to `*row`.

 Status: `DWV_ERROR_INDEX` when `index` is not below the count, `DWV_ERROR_NULL`. Then `*row` is not written.

 Required of the caller:
 `sizing` is NULL or came from this library and was not freed; `row` is NULL or can be written to.
 */
dwv_status dwv_sizing_fixture(const dwv_sizing *sizing, size_t index, dwv_fixture_row *row);

/*
 One step of the way of a fixture's air: the id of a drain that serves as a wet vent, of a vent, and at last of the terminal or valve.
 `*id` lives until the sizing is freed.

 Status: `DWV_ERROR_INDEX` when `fixture` is not below the count of fixtures or `step` not below its `air_steps`, `DWV_ERROR_NULL`. Then
 `*id` is not written.

 Required of the caller:
 `sizing` is NULL or came from this library and was not freed; `id` is NULL or can be written to.
 */
dwv_status dwv_sizing_fixture_air(const dwv_sizing *sizing,
                                  size_t fixture,
                                  size_t step,
                                  dwv_text *id);

/*
 Finds the index of a fixture by its id.

 Status: `DWV_ERROR_QUESTION` when no fixture has it, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`. Then `*index` is not written.

 Required of the caller:
 `sizing` is NULL or came from this library and was not freed; `id` is NULL or has `length` readable bytes; `index` is NULL or can be
 written to.
 */
dwv_status dwv_sizing_find_fixture(const dwv_sizing *sizing,
                                   const char *id,
                                   size_t length,
                                   size_t *index);

/*
 How many drains there are. NULL has none.

 Required of the caller:
 `sizing` is NULL or came from this library and was not freed.
 */
size_t dwv_sizing_pipe_count(const dwv_sizing *sizing);

/*
 Copies a pipe row to `*row`.

 Status: `DWV_ERROR_INDEX` when `index` is not below the count, `DWV_ERROR_NULL`. Then `*row` is not written.

 Required of the caller:
 `sizing` is NULL or came from this library and was not freed; `row` is NULL or can be written to.
 */
dwv_status dwv_sizing_pipe(const dwv_sizing *sizing, size_t index, dwv_pipe_row *row);

/*
 Copies one reason of a pipe to `*row`.

 Status: `DWV_ERROR_INDEX` when `pipe` is not below the count of pipes or `reason` not below its `reasons`, `DWV_ERROR_NULL`. Then `*row`
 is not written.

 Required of the caller:
 `sizing` is NULL or came from this library and was not freed; `row` is NULL or can be written to.
 */
dwv_status dwv_sizing_pipe_reason(const dwv_sizing *sizing,
                                  size_t pipe,
                                  size_t reason,
                                  dwv_reason_row *row);

/*
 Finds the index of a pipe by its id.

 Status: `DWV_ERROR_QUESTION` when no pipe has it, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`. Then `*index` is not written.

 Required of the caller:
 `sizing` is NULL or came from this library and was not freed; `id` is NULL or has `length` readable bytes; `index` is NULL or can be
 written to.
 */
dwv_status dwv_sizing_find_pipe(const dwv_sizing *sizing,
                                const char *id,
                                size_t length,
                                size_t *index);

/*
 Copies the head of a report to `*summary`. Its texts live until the sizing is freed.

 Status: `DWV_ERROR_NULL`. Then `*summary` is not written.

 Required of the caller:
 `sizing` is NULL or came from this library and was not freed; `summary` is NULL or can be written to.
 */
dwv_status dwv_sizing_summary(const dwv_sizing *sizing, dwv_summary *summary);

/*
 A reading of the edition that is in force, in words. `*reading` lives until the sizing is freed.

 Status: `DWV_ERROR_INDEX` when `index` is not below `readings` of the summary, `DWV_ERROR_NULL`. Then `*reading` is not written.

 Required of the caller:
 `sizing` is NULL or came from this library and was not freed; `reading` is NULL or can be written to.
 */
dwv_status dwv_sizing_reading(const dwv_sizing *sizing,
                              size_t index,
                              dwv_text *reading);

/*
 One line on the sizes that rest on values which nobody has seen in print; empty when there is none, and for NULL. It lives until the
 sizing is freed.

 Required of the caller:
 `sizing` is NULL or came from this library and was not freed.
 */
dwv_text dwv_sizing_unattested(const dwv_sizing *sizing);

/*
 How many terminals there are. NULL has none.

 Required of the caller:
 `sizing` is NULL or came from this library and was not freed.
 */
size_t dwv_sizing_terminal_count(const dwv_sizing *sizing);

/*
 Copies a terminal row to `*row`.

 Status: `DWV_ERROR_INDEX` when `index` is not below the count, `DWV_ERROR_NULL`. Then `*row` is not written.

 Required of the caller:
 `sizing` is NULL or came from this library and was not freed; `row` is NULL or can be written to.
 */
dwv_status dwv_sizing_terminal(const dwv_sizing *sizing, size_t index, dwv_terminal_row *row);

/*
 Copies one reason of a terminal to `*row`.

 Status: `DWV_ERROR_INDEX` when `terminal` is not below the count of terminals or `reason` not below its `reasons`, `DWV_ERROR_NULL`. Then `*row`
 is not written.

 Required of the caller:
 `sizing` is NULL or came from this library and was not freed; `row` is NULL or can be written to.
 */
dwv_status dwv_sizing_terminal_reason(const dwv_sizing *sizing,
                                      size_t terminal,
                                      size_t reason,
                                      dwv_reason_row *row);

/*
 Finds the index of a terminal by its id.

 Status: `DWV_ERROR_QUESTION` when no terminal has it, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`. Then `*index` is not written.

 Required of the caller:
 `sizing` is NULL or came from this library and was not freed; `id` is NULL or has `length` readable bytes; `index` is NULL or can be
 written to.
 */
dwv_status dwv_sizing_find_terminal(const dwv_sizing *sizing,
                                    const char *id,
                                    size_t length,
                                    size_t *index);

/*
 How many vents there are. NULL has none.

 Required of the caller:
 `sizing` is NULL or came from this library and was not freed.
 */
size_t dwv_sizing_vent_count(const dwv_sizing *sizing);

/*
 Copies a vent row to `*row`.

 Status: `DWV_ERROR_INDEX` when `index` is not below the count, `DWV_ERROR_NULL`. Then `*row` is not written.

 Required of the caller:
 `sizing` is NULL or came from this library and was not freed; `row` is NULL or can be written to.
 */
dwv_status dwv_sizing_vent(const dwv_sizing *sizing, size_t index, dwv_vent_row *row);

/*
 Copies one reason of a vent to `*row`.

 Status: `DWV_ERROR_INDEX` when `vent` is not below the count of vents or `reason` not below its `reasons`, `DWV_ERROR_NULL`. Then `*row`
 is not written.

 Required of the caller:
 `sizing` is NULL or came from this library and was not freed; `row` is NULL or can be written to.
 */
dwv_status dwv_sizing_vent_reason(const dwv_sizing *sizing,
                                  size_t vent,
                                  size_t reason,
                                  dwv_reason_row *row);

/*
 Finds the index of a vent by its id.

 Status: `DWV_ERROR_QUESTION` when no vent has it, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`. Then `*index` is not written.

 Required of the caller:
 `sizing` is NULL or came from this library and was not freed; `id` is NULL or has `length` readable bytes; `index` is NULL or can be
 written to.
 */
dwv_status dwv_sizing_find_vent(const dwv_sizing *sizing,
                                const char *id,
                                size_t length,
                                size_t *index);

/*
 Sizes a layout. The caller owns `*sizing`, which does not need the layout any more. `options` may be NULL for the defaults.

 Status: `DWV_ERROR_DRAWING` with all faults of the drawing, `DWV_ERROR_EDITION`, `DWV_ERROR_QUESTION` for an unknown option,
 `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`.

 Required of the caller:
 `layout` came from this library and was not freed; `options` is NULL or can be read; `sizing`, and `error` unless NULL, can be
 written to.
 */
dwv_status dwv_size(const dwv_layout *layout,
                    const dwv_size_options *options,
                    dwv_sizing **sizing,
                    dwv_error **error);

/*
 Frees a sizing with all texts and rows that point into it. NULL is accepted.

 Required of the caller:
 `sizing` is NULL or came from this library and was not freed.
 */
void dwv_sizing_free(dwv_sizing *sizing);

/*
 The whole result as canonical JSON, the same bytes from every face. The caller owns `*json`.

 Status: `DWV_ERROR_NULL`.

 Required of the caller:
 `sizing` came from this library and was not freed; `json`, and `error` unless NULL, can be written to.
 */
dwv_status dwv_sizing_to_json(const dwv_sizing *sizing, dwv_string **json, dwv_error **error);

/*
 The whole report as aligned text. The caller owns `*report`.

 Status: `DWV_ERROR_NULL`.

 Required of the caller:
 `sizing` came from this library and was not freed; `report`, and `error` unless NULL, can be written to.
 */
dwv_status dwv_sizing_to_text(const dwv_sizing *sizing, dwv_string **report, dwv_error **error);

/*
 One schedule as comma-separated values: `pipes`, `vents`, `fixtures`, `inverts` or `findings`. The caller owns `*csv`.

 Status: `DWV_ERROR_QUESTION` for another name, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`.

 Required of the caller:
 `sizing` came from this library and was not freed; `name` has `length` readable bytes; `csv`, and `error` unless NULL, can be
 written to.
 */
dwv_status dwv_sizing_schedule_csv(const dwv_sizing *sizing,
                                   const char *name,
                                   size_t length,
                                   dwv_string **csv,
                                   dwv_error **error);

/*
 One schedule as aligned text, by the names of `dwv_sizing_schedule_csv`. The caller owns `*table`.

 Status: `DWV_ERROR_QUESTION` for another name, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`.

 Required of the caller:
 `sizing` came from this library and was not freed; `name` has `length` readable bytes; `table`, and `error` unless NULL, can be
 written to.
 */
dwv_status dwv_sizing_schedule_text(const dwv_sizing *sizing,
                                    const char *name,
                                    size_t length,
                                    dwv_string **table,
                                    dwv_error **error);

/*
 Why a pipe, fixture or terminal is what it is, in words. The caller owns `*explanation`.

 Status: `DWV_ERROR_QUESTION` when nothing has the id, with the nearest; `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`.

 Required of the caller:
 `sizing` came from this library and was not freed; `id` has `length` readable bytes; `explanation`, and `error` unless NULL, can be
 written to.
 */
dwv_status dwv_sizing_why(const dwv_sizing *sizing,
                          const char *id,
                          size_t length,
                          dwv_string **explanation,
                          dwv_error **error);

/*
 A status in words, for any number. The text lives as long as the program.
 */
dwv_text dwv_status_text(int32_t status);

/*
 The text of a string. It lives until the string is freed. NULL gives an empty text.

 Required of the caller:
 `string` is NULL or came from this library and was not freed.
 */
dwv_text dwv_string_text(const dwv_string *string);

/*
 Frees a string. NULL is accepted.

 Required of the caller:
 `string` is NULL or came from this library and was not freed.
 */
void dwv_string_free(dwv_string *string);

/*
 The least vent for the largest trap that it serves; both in hundredths of an inch: 200 for a 2 in trap.

 Status: `DWV_ERROR_QUANTITY` for a size that the trade does not list, `DWV_ERROR_QUESTION` for a trap that the table does not have,
 `DWV_ERROR_NULL`. Then `*vent_hundredths` is not written.

 Required of the caller:
 `edition` came from this library and was not freed; `vent_hundredths`, and `error` unless NULL, can be written to.
 */
dwv_status dwv_vent_for_trap(const dwv_edition *edition,
                             uint32_t trap_hundredths,
                             uint32_t *vent_hundredths,
                             dwv_error **error);

/*
 The least drain for a load by its role, in hundredths of an inch, by the table of that role alone: size a layout to have all rules.
 `role` is one of `dwv_drain_role`. The slope counts for building drains: `slope_rise` in `slope_run`, or 0 in 0 for the least
 slope of each size.

 Status: `DWV_ERROR_QUANTITY` for what is no slope, `DWV_ERROR_QUESTION` for an unknown role or a load beyond the table,
 `DWV_ERROR_NULL`. Then `*size_hundredths` is not written.

 Required of the caller:
 `edition` came from this library and was not freed; `size_hundredths`, and `error` unless NULL, can be written to.
 */
dwv_status dwv_drain_for_load(const dwv_edition *edition,
                              int32_t role,
                              uint64_t load_thousandths,
                              uint32_t slope_rise,
                              uint32_t slope_run,
                              uint32_t *size_hundredths,
                              dwv_error **error);

/*
 The load of a kind of fixture in thousandths of a fixture unit. `trap_hundredths` is its trap in hundredths of an inch, or 0 for the
 trap of the table.

 Status: `DWV_ERROR_QUESTION` for a kind that the edition does not list, with the nearest, or one without a load;
 `DWV_ERROR_QUANTITY` for a size that the trade does not list, `DWV_ERROR_TEXT`, `DWV_ERROR_NULL`. Then `*load_thousandths` is not
 written.

 Required of the caller:
 `edition` came from this library and was not freed; `kind` has `length` readable bytes; `load_thousandths`, and `error` unless NULL,
 can be written to.
 */
dwv_status dwv_load_of_fixture(const dwv_edition *edition,
                               const char *kind,
                               size_t length,
                               uint32_t trap_hundredths,
                               uint64_t *load_thousandths,
                               dwv_error **error);

/*
 The version of the binary interface of the library that is loaded: `DWV_ABI_VERSION` when it fits this header.
 */
uint32_t dwv_abi_version(void);

/*
 The version of the library that is loaded, such as `0.1.0`. The text lives as long as the program.
 */
dwv_text dwv_version(void);

/*
 The caution that every report carries. The text lives as long as the program.
 */
dwv_text dwv_caution(void);

#ifdef __cplusplus
}  // extern "C"
#endif  // __cplusplus

#endif  /* DWV_H */
