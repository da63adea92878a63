/* A panic behind the guard, provoked by a library that holds this one and a function for it: it comes back as a status. */
#include <string.h>

#include "check.h"
#include "dwv.h"

/* Panics with the words `provoked`. */
dwv_status dwv_provoke_panic(dwv_error **error);

int main(void)
{
    dwv_layout *layout = NULL;
    dwv_sizing *sizing = NULL;
    dwv_error *error = NULL;
    dwv_string *before = NULL, *after = NULL;
    CHECK(dwv_layout_from_json(TEXT(SINK), &layout, NULL) == DWV_OK);
    CHECK(dwv_size(layout, NULL, &sizing, NULL) == DWV_OK && dwv_sizing_to_json(sizing, &before, NULL) == DWV_OK);

    CHECK(dwv_provoke_panic(&error) == DWV_ERROR_INTERNAL && dwv_error_status(error) == DWV_ERROR_INTERNAL);
    CHECK(strstr(dwv_error_message(error).data, "provoked") != NULL);
    dwv_error_free(error);
    CHECK(dwv_provoke_panic(NULL) == DWV_ERROR_INTERNAL);

    /* What was there before is as good as before. */
    CHECK(dwv_sizing_to_json(sizing, &after, &error) == DWV_OK && error == NULL);
    CHECK(strcmp(dwv_string_text(before).data, dwv_string_text(after).data) == 0);
    dwv_string_free(before);
    dwv_string_free(after);
    dwv_sizing_free(sizing);
    CHECK(dwv_size(layout, NULL, &sizing, NULL) == DWV_OK);
    dwv_sizing_free(sizing);
    dwv_layout_free(layout);
    printf("%d failures\n", failures);
    return failures != 0;
}
