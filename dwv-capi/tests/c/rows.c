/* A sizing read from several threads at once, row by row, after its layout was freed. */
#include <pthread.h>
#include <string.h>

#include "check.h"
#include "dwv.h"

enum { THREADS = 4, ROUNDS = 20 };

/* Whether a view ends where it says. */
static int whole(dwv_text text)
{
    return text.data != NULL && strlen(text.data) == text.length;
}

/* Reads everything there is; the sum of all lengths of text stands for what was read. */
static size_t read_all(const dwv_sizing *sizing)
{
    size_t sum = 0;
    dwv_reason_row reason;
    for (size_t index = 0; index < dwv_sizing_pipe_count(sizing); index++) {
        dwv_pipe_row row;
        size_t found = 0;
        if (dwv_sizing_pipe(sizing, index, &row) != DWV_OK || !whole(row.id) || !whole(row.slope))
            return 0;
        if (dwv_sizing_find_pipe(sizing, row.id.data, row.id.length, &found) != DWV_OK || found != index)
            return 0;
        sum += row.id.length + row.name.length + row.governed_by.length + row.clause.length + row.size.text.length;
        for (size_t number = 0; number < row.reasons; number++) {
            if (dwv_sizing_pipe_reason(sizing, index, number, &reason) != DWV_OK || !whole(reason.says))
                return 0;
            sum += reason.says.length;
        }
    }
    for (size_t index = 0; index < dwv_sizing_vent_count(sizing); index++) {
        dwv_vent_row row;
        if (dwv_sizing_vent(sizing, index, &row) != DWV_OK || !whole(row.ends_at))
            return 0;
        for (size_t number = 0; number < row.reasons; number++) {
            if (dwv_sizing_vent_reason(sizing, index, number, &reason) != DWV_OK)
                return 0;
            sum += reason.clause.length;
        }
    }
    for (size_t index = 0; index < dwv_sizing_terminal_count(sizing); index++) {
        dwv_terminal_row row;
        if (dwv_sizing_terminal(sizing, index, &row) != DWV_OK || !whole(row.through))
            return 0;
        sum += row.governed_by.length;
    }
    for (size_t index = 0; index < dwv_sizing_fixture_count(sizing); index++) {
        dwv_fixture_row row;
        dwv_text step;
        if (dwv_sizing_fixture(sizing, index, &row) != DWV_OK || !whole(row.air))
            return 0;
        for (size_t number = 0; number < row.air_steps; number++) {
            if (dwv_sizing_fixture_air(sizing, index, number, &step) != DWV_OK)
                return 0;
            sum += step.length;
        }
    }
    for (size_t index = 0; index < dwv_sizing_finding_count(sizing); index++) {
        dwv_finding_row row;
        if (dwv_sizing_finding(sizing, index, &row) != DWV_OK || !whole(row.message))
            return 0;
        sum += row.message.length + row.remedy.length;
    }
    dwv_string *text = NULL;
    if (dwv_sizing_to_json(sizing, &text, NULL) != DWV_OK)
        return 0;
    sum += dwv_string_text(text).length;
    dwv_string_free(text);
    return sum;
}

struct reader {
    pthread_t thread;
    const dwv_sizing *sizing;
    size_t expected;
    int differences;
};

static void *read_again(void *argument)
{
    struct reader *reader = argument;
    for (int round = 0; round < ROUNDS; round++)
        reader->differences += read_all(reader->sizing) != reader->expected;
    return NULL;
}

int main(void)
{
    dwv_layout *layout = NULL;
    dwv_sizing *sizing = NULL, *again = NULL, *strict = NULL;
    dwv_size_options refuse = {"npc-2015", DWV_UNATTESTED_REFUSE};
    dwv_pipe_row pipe;
    size_t index = 0;
    CHECK(dwv_layout_from_json(TEXT(SINK), &layout, NULL) == DWV_OK);
    CHECK(dwv_size(layout, NULL, &sizing, NULL) == DWV_OK);
    CHECK(dwv_size(layout, NULL, &again, NULL) == DWV_OK);
    CHECK(dwv_size(layout, &refuse, &strict, NULL) == DWV_OK);
    dwv_layout_free(layout);
    CHECK(read_all(sizing) > 0 && read_all(sizing) == read_all(again) && read_all(strict) > 0);
    dwv_sizing_free(again);
    dwv_sizing_free(strict);

    CHECK(dwv_sizing_pipe_count(sizing) == 2 && dwv_sizing_vent_count(sizing) == 1);
    CHECK(dwv_sizing_terminal_count(sizing) == 1 && dwv_sizing_fixture_count(sizing) == 1);
    CHECK(dwv_sizing_find_pipe(sizing, TEXT("d1"), &index) == DWV_OK && index == 1);
    CHECK(dwv_sizing_pipe(sizing, index, &pipe) == DWV_OK && strcmp(pipe.name.data, "trap arm") == 0);
    CHECK(pipe.size.hundredths == 150 && pipe.length.known && pipe.length.nanometres == 900000000);

    struct reader readers[THREADS];
    for (int number = 0; number < THREADS; number++) {
        readers[number].sizing = sizing;
        readers[number].expected = read_all(sizing);
        readers[number].differences = 0;
        CHECK(pthread_create(&readers[number].thread, NULL, read_again, &readers[number]) == 0);
    }
    for (int number = 0; number < THREADS; number++) {
        CHECK(pthread_join(readers[number].thread, NULL) == 0);
        CHECK(readers[number].differences == 0);
    }
    dwv_sizing_free(sizing);
    printf("%d failures\n", failures);
    return failures != 0;
}
