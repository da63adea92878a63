/* Wrong calls and wrong input: each comes back with its status and, where wanted, an error object. */
#include <stdlib.h>
#include <string.h>

#include "check.h"
#include "dwv.h"

/* Whether the error has this status and one fault, which blames this argument. Frees it. */
static int blames(dwv_error *error, dwv_status status, const char *argument)
{
    dwv_fault fault;
    int holds = dwv_error_status(error) == status && dwv_error_fault_count(error) == 1 &&
                dwv_error_fault_total(error) == 1 && dwv_error_fault(error, 0, &fault) == DWV_OK &&
                strcmp(fault.path.data, argument) == 0 && fault.code.length > 0 && fault.message.length > 0 &&
                dwv_error_message(error).length > 0;
    dwv_error_free(error);
    return holds;
}

static void wrong_layouts(void)
{
    dwv_layout *layout = NULL;
    dwv_string *text = NULL;
    dwv_error *error = NULL;
    dwv_fault fault;

    CHECK(dwv_layout_from_json(NULL, 0, &layout, &error) == DWV_ERROR_NULL && blames(error, DWV_ERROR_NULL, "json"));
    CHECK(dwv_layout_from_json(TEXT(SINK), NULL, &error) == DWV_ERROR_NULL && blames(error, DWV_ERROR_NULL, "layout"));
    CHECK(dwv_layout_from_json(SINK, SIZE_MAX, &layout, &error) == DWV_ERROR_TEXT);
    CHECK(blames(error, DWV_ERROR_TEXT, "json"));
    CHECK(dwv_layout_from_json(TEXT("\xff\xfe"), &layout, NULL) == DWV_ERROR_FORMAT);
    for (size_t cut = 0; cut < sizeof SINK - 1; cut++)
        CHECK(dwv_layout_from_json(SINK, cut, &layout, NULL) == DWV_ERROR_FORMAT && layout == NULL);
    /* Each byte in turn is spoiled: whatever comes back, nothing breaks. */
    char spoiled[sizeof SINK];
    for (size_t place = 0; place < sizeof SINK - 1; place++) {
        dwv_sizing *sizing = NULL;
        memcpy(spoiled, SINK, sizeof SINK);
        spoiled[place] ^= 0x15;
        if (dwv_layout_from_json(spoiled, sizeof SINK - 1, &layout, NULL) == DWV_OK)
            dwv_size(layout, NULL, &sizing, NULL);
        dwv_sizing_free(sizing);
        dwv_layout_free(layout);
    }

    CHECK(dwv_layout_from_json(TEXT("{\"lenght\": NaN"), &layout, &error) == DWV_ERROR_FORMAT);
    CHECK(blames(error, DWV_ERROR_FORMAT, ""));
    CHECK(dwv_layout_from_json(TEXT("{\"name\": 3}"), &layout, &error) == DWV_ERROR_FORMAT);
    CHECK(dwv_error_fault_count(error) > 1 && dwv_error_fault_total(error) == dwv_error_fault_count(error));
    CHECK(dwv_error_fault(error, dwv_error_fault_count(error), &fault) == DWV_ERROR_INDEX);
    CHECK(dwv_error_fault(NULL, 0, &fault) == DWV_ERROR_NULL && dwv_error_fault(error, 0, NULL) == DWV_ERROR_NULL);
    dwv_error_free(error);

    CHECK(dwv_layout_to_json(NULL, &text, &error) == DWV_ERROR_NULL && blames(error, DWV_ERROR_NULL, "layout"));
}

static void wrong_drawing(void)
{
    char broken[sizeof SINK];
    memcpy(broken, SINK, sizeof SINK);
    /* The drain d1 ends at a joint that is not there. */
    strstr(broken, "\"to\": \"J\"")[7] = 'Q';
    dwv_layout *layout = NULL;
    /* What stands in an output before the call does not matter. */
    dwv_sizing *sizing = (dwv_sizing *)&layout;
    dwv_error *error = (dwv_error *)&layout;
    dwv_fault fault;
    CHECK(dwv_layout_from_json(broken, sizeof broken - 1, &layout, &error) == DWV_OK && error == NULL);
    CHECK(dwv_size(layout, NULL, &sizing, &error) == DWV_ERROR_DRAWING && sizing == NULL);
    CHECK(dwv_error_status(error) == DWV_ERROR_DRAWING && dwv_error_fault(error, 0, &fault) == DWV_OK);
    CHECK(strcmp(fault.path.data, "drains[0].to") == 0 && strcmp(fault.element.data, "d1") == 0);
    CHECK(strcmp(fault.code.data, "unknown-id") == 0);
    dwv_error_free(error);
    CHECK(dwv_size(NULL, NULL, &sizing, &error) == DWV_ERROR_NULL && blames(error, DWV_ERROR_NULL, "layout"));
    CHECK(dwv_size(layout, NULL, NULL, &error) == DWV_ERROR_NULL && blames(error, DWV_ERROR_NULL, "sizing"));
    dwv_layout_free(layout);
}

static void wrong_options(const dwv_layout *layout)
{
    dwv_size_options options = {"npc-1066", DWV_UNATTESTED_TELL};
    dwv_sizing *sizing = NULL;
    dwv_error *error = NULL;
    CHECK(dwv_size(layout, &options, &sizing, &error) == DWV_ERROR_EDITION);
    CHECK(dwv_error_status(error) == DWV_ERROR_EDITION);
    dwv_error_free(error);
    options.edition = "\xff";
    CHECK(dwv_size(layout, &options, &sizing, &error) == DWV_ERROR_TEXT);
    CHECK(blames(error, DWV_ERROR_TEXT, "options.edition"));
    options.edition = NULL;
    options.unattested = 7;
    CHECK(dwv_size(layout, &options, &sizing, &error) == DWV_ERROR_QUESTION && sizing == NULL);
    CHECK(blames(error, DWV_ERROR_QUESTION, "options.unattested"));
}

static void wrong_rows(const dwv_sizing *sizing)
{
    dwv_pipe_row pipe;
    dwv_reason_row reason;
    dwv_text text;
    dwv_summary summary;
    size_t index = 0;
    CHECK(dwv_sizing_pipe(sizing, 2, &pipe) == DWV_ERROR_INDEX);
    CHECK(dwv_sizing_pipe(sizing, SIZE_MAX, &pipe) == DWV_ERROR_INDEX);
    CHECK(dwv_sizing_pipe(sizing, 0, NULL) == DWV_ERROR_NULL && dwv_sizing_pipe(NULL, 0, &pipe) == DWV_ERROR_NULL);
    CHECK(dwv_sizing_pipe_reason(sizing, 99, 0, &reason) == DWV_ERROR_INDEX);
    CHECK(dwv_sizing_pipe_reason(sizing, 0, 99, &reason) == DWV_ERROR_INDEX);
    CHECK(dwv_sizing_vent_reason(NULL, 0, 0, &reason) == DWV_ERROR_NULL);
    CHECK(dwv_sizing_terminal_reason(sizing, 1, 0, &reason) == DWV_ERROR_INDEX);
    CHECK(dwv_sizing_fixture_air(sizing, 1, 0, &text) == DWV_ERROR_INDEX);
    CHECK(dwv_sizing_summary(sizing, NULL) == DWV_ERROR_NULL && dwv_sizing_summary(NULL, &summary) == DWV_ERROR_NULL);
    CHECK(dwv_sizing_reading(sizing, 99, &text) == DWV_ERROR_INDEX);
    CHECK(dwv_sizing_find_pipe(sizing, TEXT("d9"), &index) == DWV_ERROR_QUESTION);
    CHECK(dwv_sizing_find_pipe(sizing, TEXT("v"), &index) == DWV_ERROR_QUESTION);
    CHECK(dwv_sizing_find_vent(sizing, TEXT("\xff"), &index) == DWV_ERROR_TEXT);
    CHECK(dwv_sizing_find_fixture(sizing, NULL, 0, &index) == DWV_ERROR_NULL);
    CHECK(dwv_sizing_find_terminal(sizing, TEXT(""), &index) == DWV_ERROR_QUESTION);
}

static void wrong_questions(const dwv_sizing *sizing, const dwv_edition *edition)
{
    dwv_string *text = NULL;
    dwv_answer *answer = NULL;
    dwv_error *error = NULL;
    dwv_text kind;
    CHECK(dwv_sizing_why(sizing, TEXT("d9"), &text, &error) == DWV_ERROR_QUESTION && text == NULL);
    CHECK(strstr(dwv_error_message(error).data, "has the id `d9`") != NULL);
    dwv_error_free(error);
    CHECK(dwv_sizing_why(sizing, TEXT("\xc3"), &text, &error) == DWV_ERROR_TEXT && blames(error, DWV_ERROR_TEXT, "id"));
    CHECK(dwv_sizing_schedule_csv(sizing, TEXT("pipe"), &text, NULL) == DWV_ERROR_QUESTION && text == NULL);
    CHECK(dwv_sizing_schedule_text(sizing, NULL, 5, &text, NULL) == DWV_ERROR_NULL && text == NULL);
    CHECK(dwv_sizing_to_json(NULL, &text, NULL) == DWV_ERROR_NULL && text == NULL);
    CHECK(dwv_sizing_to_text(sizing, NULL, NULL) == DWV_ERROR_NULL);
    CHECK(dwv_edition_answer(edition, TEXT("{}"), &answer, &error) == DWV_ERROR_QUESTION && answer == NULL);
    CHECK(blames(error, DWV_ERROR_QUESTION, ""));
    CHECK(dwv_edition_answer(NULL, TEXT("{}"), &answer, NULL) == DWV_ERROR_NULL);
    CHECK(dwv_edition_fixture_kind(edition, SIZE_MAX, &kind) == DWV_ERROR_INDEX);
    CHECK(dwv_edition_fixture_kind(edition, 0, NULL) == DWV_ERROR_NULL);
    CHECK(dwv_edition_provenance(NULL, &text, NULL) == DWV_ERROR_NULL);
    CHECK(dwv_edition_ids(NULL, NULL) == DWV_ERROR_NULL);
}

static void nothing(void)
{
    dwv_layout_free(NULL);
    dwv_sizing_free(NULL);
    dwv_edition_free(NULL);
    dwv_answer_free(NULL);
    dwv_error_free(NULL);
    dwv_string_free(NULL);
    CHECK(dwv_sizing_pipe_count(NULL) == 0 && dwv_sizing_finding_count(NULL) == 0);
    CHECK(dwv_sizing_unattested(NULL).length == 0 && dwv_edition_fixture_kind_count(NULL) == 0);
    CHECK(dwv_error_status(NULL) == DWV_OK && dwv_error_message(NULL).length == 0);
    CHECK(dwv_error_fault_count(NULL) == 0 && dwv_error_fault_total(NULL) == 0);
    CHECK(*dwv_string_text(NULL).data == '\0' && *dwv_answer_text(NULL).data == '\0');
    CHECK(!dwv_answer_is_attested(NULL) && dwv_edition_title(NULL).length == 0);
    CHECK(strcmp(dwv_status_text(12345).data, "unknown status") == 0);
    CHECK(strcmp(dwv_status_text(-1).data, "unknown status") == 0);
}

int main(void)
{
    dwv_layout *layout = NULL;
    dwv_sizing *sizing = NULL;
    dwv_edition *edition = NULL;
    dwv_error *error = NULL;
    wrong_layouts();
    wrong_drawing();
    CHECK(dwv_layout_from_json(TEXT(SINK), &layout, NULL) == DWV_OK);
    wrong_options(layout);
    CHECK(dwv_size(layout, NULL, &sizing, NULL) == DWV_OK);
    dwv_layout_free(layout);
    wrong_rows(sizing);
    CHECK(dwv_edition_open(TEXT("npc-2016"), &edition, &error) == DWV_ERROR_EDITION && edition == NULL);
    CHECK(strstr(dwv_error_message(error).data, "did you mean `npc-2015`") != NULL);
    dwv_error_free(error);
    CHECK(dwv_edition_open(TEXT("npc-2015"), &edition, NULL) == DWV_OK);
    wrong_questions(sizing, edition);
    dwv_edition_free(edition);
    dwv_sizing_free(sizing);
    nothing();
    printf("%d failures\n", failures);
    return failures != 0;
}
