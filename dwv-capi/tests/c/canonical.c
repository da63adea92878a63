/* Writes the canonical result of a layout that comes in on standard input. */
#include <stdio.h>
#include <stdlib.h>

#include "dwv.h"

int main(void)
{
    size_t length = 0, room = 1 << 16;
    char *json = malloc(room);
    while (json != NULL) {
        size_t got = fread(json + length, 1, room - length, stdin);
        length += got;
        if (got == 0)
            break;
        if (length == room)
            json = realloc(json, room *= 2);
    }
    if (json == NULL)
        return 2;
    dwv_error *error = NULL;
    dwv_layout *layout = NULL;
    dwv_sizing *sizing = NULL;
    dwv_string *result = NULL;
    dwv_status status = dwv_layout_from_json(json, length, &layout, &error);
    if (status == DWV_OK)
        status = dwv_size(layout, NULL, &sizing, &error);
    if (status == DWV_OK)
        status = dwv_sizing_to_json(sizing, &result, &error);
    if (status == DWV_OK)
        fwrite(dwv_string_text(result).data, 1, dwv_string_text(result).length, stdout);
    else
        fprintf(stderr, "%s\n", dwv_error_message(error).data);
    dwv_string_free(result);
    dwv_sizing_free(sizing);
    dwv_layout_free(layout);
    dwv_error_free(error);
    free(json);
    return status;
}
