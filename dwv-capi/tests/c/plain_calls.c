/* Plain calls with numbers, as a spreadsheet makes them: values of published tables, and what is refused. */
#include <string.h>

#include "check.h"
#include "dwv.h"

static void table_values(const dwv_edition *edition)
{
    uint32_t size = 7;
    uint64_t load = 7;
    dwv_error *error = NULL;
    CHECK(dwv_vent_for_trap(edition, 201, &size, NULL) == DWV_ERROR_QUANTITY);
    CHECK(dwv_vent_for_trap(edition, 0, &size, NULL) == DWV_ERROR_QUANTITY);
    CHECK(dwv_vent_for_trap(edition, 1500, &size, &error) == DWV_ERROR_QUESTION);
    CHECK(strstr(dwv_error_message(error).data, "not known") != NULL);
    dwv_error_free(error);
    CHECK(dwv_vent_for_trap(NULL, 200, &size, NULL) == DWV_ERROR_NULL);
    CHECK(size == 7);
    /* NPC Table 2.5.7.1., quoted whole in Block D Drainage Systems, D-1.6: a 2 in trap asks for 1-1/2 in. */
    CHECK(dwv_vent_for_trap(edition, 200, &size, NULL) == DWV_OK && size == 150);
    /* BC Building Code Appeal Board 1352: a 3 in building drain takes 27 FU. */
    CHECK(dwv_drain_for_load(edition, DWV_BUILDING_DRAIN, 27000, 1, 50, &size, NULL) == DWV_OK && size == 300);
    CHECK(dwv_drain_for_load(edition, DWV_BUILDING_DRAIN, 27001, 1, 50, &size, NULL) == DWV_OK && size == 400);
    CHECK(dwv_drain_for_load(edition, 9, 1, 0, 0, &size, NULL) == DWV_ERROR_QUESTION);
    CHECK(dwv_drain_for_load(edition, -1, 1, 0, 0, &size, NULL) == DWV_ERROR_QUESTION);
    CHECK(dwv_drain_for_load(edition, DWV_BRANCH, UINT64_MAX, 0, 0, &size, NULL) == DWV_ERROR_QUESTION);
    CHECK(dwv_drain_for_load(edition, DWV_BUILDING_DRAIN, 1, 0, 50, &size, NULL) == DWV_ERROR_QUANTITY);
    CHECK(dwv_drain_for_load(edition, DWV_BUILDING_DRAIN, 1, 1, 0, &size, NULL) == DWV_ERROR_QUANTITY);
    CHECK(size == 400);
    /* BC Building Code Appeal Board 1860: a bathtub counts 1.5 FU. */
    CHECK(dwv_load_of_fixture(edition, TEXT("bathtub"), 0, &load, NULL) == DWV_OK && load == 1500);
    CHECK(dwv_load_of_fixture(edition, TEXT("bathtube"), 0, &load, NULL) == DWV_ERROR_QUESTION);
    CHECK(dwv_load_of_fixture(edition, TEXT("bathtub"), 1, &load, NULL) == DWV_ERROR_QUANTITY && load == 1500);
}

static void quantities(void)
{
    int64_t length = 0, fall = 7;
    uint32_t size = 0;
    dwv_slope slope = {0, 0};
    dwv_string *text = NULL;
    dwv_error *error = NULL;
    /* Plumbing trade mathematics: 9-1/2 ft at 1/4 in per ft fall 2-3/8 in. */
    CHECK(dwv_length_parse(TEXT("9-1/2 ft"), &length, NULL) == DWV_OK && length == 2895600000);
    CHECK(dwv_slope_parse(TEXT("1/4 in per ft"), &slope, NULL) == DWV_OK && slope.rise == 1 && slope.run == 48);
    CHECK(dwv_fall(length, 1, 0, &fall, NULL) == DWV_ERROR_QUANTITY && fall == 7);
    CHECK(dwv_fall(INT64_MAX, 1, 50, &fall, NULL) == DWV_ERROR_QUANTITY && fall == 7);
    CHECK(dwv_fall(INT64_MIN, 1, 50, &fall, NULL) == DWV_ERROR_QUANTITY && fall == 7);
    CHECK(dwv_fall(length, UINT32_MAX, 1, &fall, NULL) == DWV_ERROR_QUANTITY && fall == 7);
    CHECK(dwv_fall(length, slope.rise, slope.run, &fall, NULL) == DWV_OK && fall == 60325000);
    CHECK(dwv_fall(-length, slope.rise, slope.run, &fall, NULL) == DWV_OK && fall == -60325000);
    CHECK(dwv_length_text(fall, TEXT("in"), &text, NULL) == DWV_OK);
    CHECK(strcmp(dwv_string_text(text).data, "-2-3/8 in") == 0);
    dwv_string_free(text);
    CHECK(dwv_length_text(length, TEXT("m"), &text, NULL) == DWV_OK);
    CHECK(strcmp(dwv_string_text(text).data, "2.896 m") == 0);
    dwv_string_free(text);
    CHECK(dwv_length_text(length, TEXT("cubit"), &text, NULL) == DWV_ERROR_QUANTITY && text == NULL);

    CHECK(dwv_length_parse(TEXT("9 cubits"), &length, &error) == DWV_ERROR_QUANTITY && length == 2895600000);
    CHECK(strstr(dwv_error_message(error).data, "unknown unit `cubits`") != NULL);
    dwv_error_free(error);
    CHECK(dwv_length_parse(NULL, 3, &length, NULL) == DWV_ERROR_NULL);
    CHECK(dwv_slope_parse(TEXT("flat"), &slope, NULL) == DWV_ERROR_QUANTITY && slope.run == 48);
    CHECK(dwv_pipe_size_parse(TEXT("1-1/2"), &size, NULL) == DWV_OK && size == 150);
    CHECK(dwv_pipe_size_parse(TEXT("7"), &size, NULL) == DWV_ERROR_QUANTITY && size == 150);
}

static void editions(const dwv_edition *edition)
{
    dwv_string *text = NULL;
    dwv_answer *answer = NULL;
    CHECK(dwv_edition_ids(&text, NULL) == DWV_OK && strstr(dwv_string_text(text).data, "npc-2015\n") != NULL);
    dwv_string_free(text);
    CHECK(strstr(dwv_edition_title(edition).data, "2015") != NULL);
    CHECK(dwv_edition_provenance(edition, &text, NULL) == DWV_OK && dwv_string_text(text).length > 1000);
    dwv_string_free(text);
    CHECK(dwv_edition_fixture_kind_count(edition) > 0);
    /* Every kind that is listed can be asked for. */
    for (size_t index = 0; index < dwv_edition_fixture_kind_count(edition); index++) {
        char question[200];
        dwv_text kind;
        CHECK(dwv_edition_fixture_kind(edition, index, &kind) == DWV_OK);
        int length = snprintf(question, sizeof question, "{\"ask\": \"fixture-outlet\", \"fixture\": \"%s\"}", kind.data);
        CHECK(dwv_edition_answer(edition, question, (size_t)length, &answer, NULL) == DWV_OK);
        CHECK(dwv_answer_text(answer).length > 0 && strstr(dwv_answer_clause(answer).data, "NPC 2015") != NULL);
        CHECK(dwv_answer_witness(answer).length > 0);
        dwv_answer_free(answer);
    }
    /* NPC Table 2.5.7.1. was seen in print. */
    CHECK(dwv_edition_answer(edition, TEXT("{\"ask\": \"vent-for-trap\", \"trap\": \"2\"}"), &answer, NULL) == DWV_OK);
    CHECK(dwv_answer_is_attested(answer));
    dwv_answer_free(answer);
}

int main(void)
{
    dwv_edition *edition = NULL;
    CHECK(dwv_abi_version() == DWV_ABI_VERSION && strcmp(dwv_version().data, DWV_VERSION) == 0);
    CHECK(dwv_edition_open(TEXT("npc-2015"), &edition, NULL) == DWV_OK);
    table_values(edition);
    quantities();
    editions(edition);
    dwv_edition_free(edition);
    printf("%d failures\n", failures);
    return failures != 0;
}
