/* Wrong calls and wrong input: each comes back with its status and, where wanted, an error object. */
#include <stdio.h>
#include <stdlib.h>
#include <string.h>

#include "dwv.h"

static int failures = 0;

#define CHECK(holds)                                                     \
    do {                                                                 \
        if (!(holds)) {                                                  \
            printf("line %d: %s does not hold\n", __LINE__, #holds);     \
            failures++;                                                  \
        }                                                                \
    } while (0)

static const char SINK[] =
    "{\"format\": \"dwv-layout/1\", \"name\": \"sink\", \"edition\": \"npc-2015\", \"frost_can_close_vents\": true,"
    " \"levels\": [{\"id\": \"main\", \"floor\": \"0 m\"}],"
    " \"fixtures\": [{\"id\": \"KS\", \"kind\": \"kitchen-sink\", \"level\": \"main\", \"height\": \"0.45 m\"}],"
    " \"joints\": [{\"id\": \"J\", \"level\": \"main\", \"height\": \"0.4 m\"}, {\"id\": \"S\", \"level\": \"main\", \"height\": \"-1 m\"}],"
    " \"drains\": [{\"id\": \"d1\", \"from\": \"KS\", \"to\": \"J\", \"runs\": \"level\", \"length\": \"0.9 m\"},"
    "              {\"id\": \"d2\", \"from\": \"J\", \"to\": \"S\", \"runs\": \"vertical\"}],"
    " \"vents\": [{\"id\": \"v\", \"from\": \"J\", \"to\": \"T\", \"length\": \"3 m\"}],"
    " \"terminals\": [{\"id\": \"T\", \"through\": \"roof\", \"above\": \"300 mm\"}],"
    " \"sewer\": {\"at\": \"S\", \"invert\": \"-1 m\"}}";

static void wrong_input(void)
{
    dwv_layout *layout = NULL;
    dwv_error *error = NULL;
    dwv_fault fault;

    CHECK(dwv_layout_from_json(NULL, 0, &layout, &error) == DWV_ERROR_NULL);
    CHECK(dwv_error_status(error) == DWV_ERROR_NULL && dwv_error_fault_count(error) == 0);
    dwv_error_free(error);
    CHECK(dwv_layout_from_json(SINK, sizeof SINK - 1, NULL, NULL) == DWV_ERROR_NULL);
    CHECK(dwv_layout_from_json("\xff\xfe", 2, &layout, NULL) == DWV_ERROR_FORMAT);
    CHECK(dwv_layout_from_json("", 0, &layout, NULL) == DWV_ERROR_FORMAT);
    for (size_t cut = 0; cut < sizeof SINK - 1; cut++)
        CHECK(dwv_layout_from_json(SINK, cut, &layout, NULL) == DWV_ERROR_FORMAT);

    CHECK(dwv_layout_from_json("{\"lenght\": NaN", 14, &layout, &error) == DWV_ERROR_FORMAT);
    dwv_error_free(error);
    CHECK(dwv_layout_from_json("{\"name\": 3}", 11, &layout, &error) == DWV_ERROR_FORMAT);
    CHECK(dwv_error_fault_count(error) > 1 && dwv_error_fault_total(error) == dwv_error_fault_count(error));
    CHECK(dwv_error_fault(error, 0, &fault) == DWV_OK && fault.code.length > 0 && fault.message.length > 0);
    CHECK(dwv_error_fault(error, 1000, &fault) == DWV_ERROR_INDEX);
    CHECK(dwv_error_fault(NULL, 0, &fault) == DWV_ERROR_NULL && dwv_error_fault(error, 0, NULL) == DWV_ERROR_NULL);
    dwv_error_free(error);
    CHECK(layout == NULL);
}

static void wrong_drawing(void)
{
    char broken[sizeof SINK];
    memcpy(broken, SINK, sizeof SINK);
    /* The drain d1 ends at a joint that is not there. */
    char *end = strstr(broken, "\"to\": \"J\"");
    end[7] = 'Q';
    dwv_layout *layout = NULL;
    dwv_sizing *sizing = NULL;
    dwv_error *error = NULL;
    dwv_fault fault;
    CHECK(dwv_layout_from_json(broken, sizeof broken - 1, &layout, &error) == DWV_OK && error == NULL);
    CHECK(dwv_size(layout, NULL, &sizing, &error) == DWV_ERROR_DRAWING && sizing == NULL);
    CHECK(dwv_error_fault(error, 0, &fault) == DWV_OK);
    CHECK(strcmp(fault.path.data, "drains[0].to") == 0 && strcmp(fault.element.data, "d1") == 0);
    CHECK(strcmp(fault.code.data, "unknown-id") == 0);
    dwv_error_free(error);
    CHECK(dwv_size(NULL, NULL, &sizing, NULL) == DWV_ERROR_NULL);
    dwv_layout_free(layout);
}

static void wrong_questions(const dwv_layout *layout)
{
    dwv_size_options options = {"npc-1066", DWV_UNATTESTED_TELL};
    dwv_sizing *sizing = NULL;
    dwv_pipe_row pipe;
    dwv_reason_row reason;
    dwv_string *text = NULL;
    size_t index = 0;
    CHECK(dwv_size(layout, &options, &sizing, NULL) == DWV_ERROR_EDITION);
    options.edition = "\xff";
    CHECK(dwv_size(layout, &options, &sizing, NULL) == DWV_ERROR_TEXT);
    options.edition = NULL;
    options.unattested = 7;
    CHECK(dwv_size(layout, &options, &sizing, NULL) == DWV_ERROR_QUESTION && sizing == NULL);
    options.unattested = DWV_UNATTESTED_REFUSE;
    CHECK(dwv_size(layout, &options, &sizing, NULL) == DWV_OK);
    dwv_sizing_free(sizing);
    CHECK(dwv_size(layout, NULL, &sizing, NULL) == DWV_OK);

    CHECK(dwv_sizing_pipe_count(sizing) == 2 && dwv_sizing_vent_count(sizing) == 1);
    CHECK(dwv_sizing_terminal_count(sizing) == 1 && dwv_sizing_fixture_count(sizing) == 1);
    CHECK(dwv_sizing_pipe(sizing, 2, &pipe) == DWV_ERROR_INDEX);
    CHECK(dwv_sizing_pipe(sizing, SIZE_MAX, &pipe) == DWV_ERROR_INDEX);
    CHECK(dwv_sizing_pipe(sizing, 0, NULL) == DWV_ERROR_NULL && dwv_sizing_pipe(NULL, 0, &pipe) == DWV_ERROR_NULL);
    CHECK(dwv_sizing_find_pipe(sizing, "d1", 2, &index) == DWV_OK && index == 1);
    CHECK(dwv_sizing_pipe(sizing, index, &pipe) == DWV_OK && strcmp(pipe.name.data, "trap arm") == 0);
    CHECK(pipe.size.hundredths == 150 && pipe.length.known && pipe.length.nanometres == 900000000);
    CHECK(dwv_sizing_pipe_reason(sizing, index, 0, &reason) == DWV_OK && reason.clause.length > 0);
    CHECK(dwv_sizing_pipe_reason(sizing, index, pipe.reasons, &reason) == DWV_ERROR_INDEX);
    CHECK(dwv_sizing_pipe_reason(sizing, 99, 0, &reason) == DWV_ERROR_INDEX);
    CHECK(dwv_sizing_find_pipe(sizing, "d9", 2, &index) == DWV_ERROR_QUESTION);
    CHECK(dwv_sizing_why(sizing, "d9", 2, &text, NULL) == DWV_ERROR_QUESTION && text == NULL);
    CHECK(dwv_sizing_schedule_csv(sizing, "pipe", 4, &text, NULL) == DWV_ERROR_QUESTION && text == NULL);
    CHECK(dwv_sizing_schedule_csv(sizing, "pipes", 5, &text, NULL) == DWV_OK && dwv_string_text(text).length > 100);
    dwv_string_free(text);
    dwv_sizing_free(sizing);
}

static void plain_calls(void)
{
    dwv_edition *edition = NULL;
    dwv_error *error = NULL;
    uint32_t size = 0;
    uint64_t load = 0;
    int64_t length = 0, fall = 0;
    CHECK(dwv_edition_open("npc-2016", 8, &edition, &error) == DWV_ERROR_EDITION && edition == NULL);
    dwv_error_free(error);
    CHECK(dwv_edition_open("npc-2015", 8, &edition, NULL) == DWV_OK);
    /* NPC Table 2.5.7.1., quoted whole in Block D Drainage Systems, D-1.6: a 2 in trap asks for 1-1/2 in. */
    CHECK(dwv_vent_for_trap(edition, 200, &size, NULL) == DWV_OK && size == 150);
    CHECK(dwv_vent_for_trap(edition, 201, &size, NULL) == DWV_ERROR_QUANTITY);
    CHECK(dwv_vent_for_trap(edition, 1500, &size, NULL) == DWV_ERROR_QUESTION);
    CHECK(dwv_vent_for_trap(NULL, 200, &size, NULL) == DWV_ERROR_NULL);
    /* BC Building Code Appeal Board 1352: a 3 in building drain takes 27 FU. */
    CHECK(dwv_drain_for_load(edition, DWV_BUILDING_DRAIN, 27000, 1, 50, &size, NULL) == DWV_OK && size == 300);
    CHECK(dwv_drain_for_load(edition, DWV_BUILDING_DRAIN, 27001, 1, 50, &size, NULL) == DWV_OK && size == 400);
    CHECK(dwv_drain_for_load(edition, 9, 1, 0, 0, &size, NULL) == DWV_ERROR_QUESTION);
    CHECK(dwv_drain_for_load(edition, DWV_BRANCH, UINT64_MAX, 0, 0, &size, NULL) == DWV_ERROR_QUESTION);
    CHECK(dwv_drain_for_load(edition, DWV_BUILDING_DRAIN, 1, 0, 50, &size, NULL) == DWV_ERROR_QUANTITY);
    /* BC Building Code Appeal Board 1860: a bathtub counts 1.5 FU. */
    CHECK(dwv_load_of_fixture(edition, "bathtub", 7, 0, &load, NULL) == DWV_OK && load == 1500);
    CHECK(dwv_load_of_fixture(edition, "bathtube", 8, 0, &load, NULL) == DWV_ERROR_QUESTION);
    /* Plumbing trade mathematics: 9-1/2 ft at 1/4 in per ft fall 2-3/8 in. */
    CHECK(dwv_length_parse("9-1/2 ft", 8, &length, NULL) == DWV_OK && length == 2895600000);
    CHECK(dwv_fall(length, 1, 48, &fall, NULL) == DWV_OK && fall == 60325000);
    CHECK(dwv_fall(length, 1, 0, &fall, NULL) == DWV_ERROR_QUANTITY);
    CHECK(dwv_length_parse("9 cubits", 8, &length, NULL) == DWV_ERROR_QUANTITY);
    dwv_edition_free(edition);
}

int main(void)
{
    dwv_layout *layout = NULL;
    wrong_input();
    wrong_drawing();
    CHECK(dwv_layout_from_json(SINK, sizeof SINK - 1, &layout, NULL) == DWV_OK);
    wrong_questions(layout);
    dwv_layout_free(layout);
    plain_calls();

    /* Nothing is as good as NULL. */
    dwv_layout_free(NULL);
    dwv_sizing_free(NULL);
    dwv_edition_free(NULL);
    dwv_answer_free(NULL);
    dwv_error_free(NULL);
    dwv_string_free(NULL);
    CHECK(dwv_sizing_pipe_count(NULL) == 0 && dwv_error_message(NULL).length == 0);
    CHECK(dwv_status_text(DWV_ERROR_DRAWING).length > 0 && dwv_status_text(12345).length > 0);
    CHECK(dwv_abi_version() == 1);
    printf("%d failures\n", failures);
    return failures;
}
