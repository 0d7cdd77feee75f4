/*
 * rankstead.h - the whole public contract of librankstead.
 *
 * Rankstead compares small, skewed, tied and incomplete measurements with rank tests: exact p values, estimates
 * and confidence limits that never contradict them, an account of every cell, and a sentence for a report.
 *
 * How a question is put
 *     rks_inquiry_new("pairs", &inquiry);                       which design
 *     rks_inquiry_numbers(inquiry, "before", before, 18, 1);    the data, one call for each argument
 *     rks_inquiry_numbers(inquiry, "after", after, 18, 1);
 *     rks_inquiry_set(inquiry, "side", "lower");                how it is to be answered (may be left out)
 *     rks_inquiry_run(inquiry);                                 the computation
 *     rks_inquiry_number(inquiry, "p", &p);                     any number of answers
 *     rks_inquiry_free(inquiry);
 *
 * Words (studies, arguments, answers, settings and their values) are UTF-8. Upper and lower case are the same,
 * and spaces, hyphens and underscores are the same. Words and status numbers are only ever added to.
 *
 * Ownership: the caller owns the handle and nothing else. Every pointer that a call hands out belongs to the
 * inquiry and lives until the next run or the release of that inquiry; pointers from calls without an inquiry
 * live as long as the library.
 *
 * Threads: one handle is for one thread at a time; different handles may be used at once. Results do not depend on
 * locale, thread, rounding mode or machine.
 *
 * Caution: Rankstead describes and compares groups for audit, improvement, research and teaching. It is not for the
 * diagnosis, monitoring or treatment of a person. It supports, and does not replace, a statistician and licensed
 * practice; follow local governance.
 */
#ifndef RANKSTEAD_H
#define RANKSTEAD_H

#include <stddef.h>
#include <stdint.h>

#if defined(_WIN32)
#define RKS_API __declspec(dllexport)
#elif defined(__GNUC__)
#define RKS_API __attribute__((visibility("default")))
#else
#define RKS_API
#endif

#ifdef __cplusplus
extern "C" {
#endif

/* ------------------------------------------------------------------------------------------------ status numbers */

/* What became of a call. 0 is success; every other number is pinned: never moved, never used again. */
typedef int32_t rks_status;

enum {
    RKS_OK = 0,
    RKS_BLANK = 1, /* the answer is blank on purpose, e.g. z where the exact law was used */

    RKS_BAD_CALL = 10,         /* a null pointer, a size that cannot be, a text that is not UTF-8 */
    RKS_UNKNOWN_STUDY = 11,    /* no study has this name */
    RKS_UNKNOWN_ARGUMENT = 12, /* this study has no such argument */
    RKS_UNKNOWN_ANSWER = 13,   /* this study has no such answer */
    RKS_UNKNOWN_SETTING = 14,  /* no setting has this name, or it does not fit this study */
    RKS_BAD_SETTING = 15,      /* the setting does not take this value */
    RKS_WRONG_KIND = 16,       /* a number was asked of a text answer, or the like */
    RKS_NOT_RUN = 17,          /* an answer was asked for before rks_inquiry_run */

    RKS_BAD_DATA = 30,        /* a cell cannot be used; message and rks_inquiry_where say which */
    RKS_NO_DATA = 31,         /* an argument is missing, or nothing in it can be used */
    RKS_UNEQUAL_LENGTHS = 32, /* before and after differ in length */
    RKS_TOO_LARGE = 33,       /* more values than this call takes */

    RKS_NO_ANSWER = 50, /* computed, but this number does not exist, e.g. a limit that no data this small has */

    RKS_OUT_OF_MEMORY = 70,
    RKS_INTERNAL = 71 /* a fault of the library: please report it */
};

/* ------------------------------------------------------------------------------------------------ cells */

/* What an rks_cell holds. */
enum {
    RKS_CELL_BLANK = 0,  /* nothing; a text of length 0 is taken for a blank too */
    RKS_CELL_NUMBER = 1, /* `number` */
    RKS_CELL_TEXT = 2,   /* `text`, UTF-8, `length` bytes, need not end in a zero byte */
    RKS_CELL_STATUS = 3  /* only in tables handed out: no number can be given, `number` is the status */
};

/* One spreadsheet cell. `reserved` must be 0. */
typedef struct {
    int32_t kind;
    int32_t reserved;
    double number;
    const char* text;
    size_t length;
} rks_cell;

/* ------------------------------------------------------------------------------------------------ inquiries */

/* One study with its data, its settings and, once run, its outcome. */
typedef struct rks_inquiry rks_inquiry;

/*
 * Opens an inquiry.
 *   study   a study word, e.g. "single", "pairs", "groups"; see rks_study_word.
 *   out     receives the handle, or NULL on failure. Release it with rks_inquiry_free.
 * Returns RKS_OK, RKS_BAD_CALL (a null pointer), RKS_UNKNOWN_STUDY, RKS_OUT_OF_MEMORY. Since ABI 1.
 */
RKS_API rks_status rks_inquiry_new(const char* study, rks_inquiry** out);

/* Releases an inquiry and everything handed out by it. NULL is fine. Since ABI 1. */
RKS_API void rks_inquiry_free(rks_inquiry* inquiry);

/*
 * Gives one argument as numbers, rows x columns, row by row (a column is n x 1).
 *   argument  an argument word of the study; see rks_argument_word.
 *   values    rows * columns numbers, in the unit of the measurement. They are borrowed until run returns.
 *             A NaN or an infinity makes run fail with RKS_BAD_DATA and its position; it is never ranked.
 *   rows, columns  may be 0, for an argument without values.
 * Giving the same argument again replaces it. Any change discards the outcome of an earlier run.
 * Returns RKS_OK, RKS_BAD_CALL (a null pointer, or rows * columns overflows), RKS_UNKNOWN_ARGUMENT,
 * RKS_OUT_OF_MEMORY. Since ABI 1.
 */
RKS_API rks_status rks_inquiry_numbers(rks_inquiry* inquiry, const char* argument, const double* values, size_t rows,
                                       size_t columns);

/*
 * Gives one argument as cells, rows x columns, row by row. Cells and their texts are borrowed until run returns.
 * A text in the first cell, above numbers, is the heading. Any other text must be declared by the setting `missing`
 * or be a number under the setting `numbers`; else run fails with RKS_BAD_DATA and the position.
 * The argument "settings", which every study has, takes either one cell with a text `name=value; name=value`, or a
 * block of two columns, name and value; those cells are read at once and may contain settings that only other
 * studies use. A text of settings may not: RKS_UNKNOWN_SETTING.
 * Returns as rks_inquiry_numbers, and RKS_UNKNOWN_SETTING or RKS_BAD_SETTING for "settings". Since ABI 1.
 */
RKS_API rks_status rks_inquiry_cells(rks_inquiry* inquiry, const char* argument, const rks_cell* cells, size_t rows,
                                     size_t columns);

/*
 * Gives one setting.
 *   setting, value   words as listed by rks_setting_word and rks_setting_values; decimals with a point, in every
 *                    locale. An empty value restores the default.
 * Returns RKS_OK, RKS_BAD_CALL, RKS_UNKNOWN_SETTING, RKS_BAD_SETTING (the message lists the valid words),
 * RKS_OUT_OF_MEMORY. Since ABI 1.
 */
RKS_API rks_status rks_inquiry_set(rks_inquiry* inquiry, const char* setting, const char* value);

/*
 * Computes. The borrowed data are not looked at after it returns.
 * Returns RKS_OK, RKS_BAD_CALL, RKS_BAD_DATA, RKS_NO_DATA, RKS_UNEQUAL_LENGTHS, RKS_TOO_LARGE, RKS_OUT_OF_MEMORY,
 * RKS_INTERNAL. After a failure text answers can still be asked for: they say why. Since ABI 1.
 */
RKS_API rks_status rks_inquiry_run(rks_inquiry* inquiry);

/*
 * Reads a number answer.
 *   answer  an answer word of the study (rks_answer_word); a trailing colon and anything from the first `(` on are
 *           ignored, so that "Estimate (days):" works.
 *   out     receives the number, never rounded; NaN whenever the status is not RKS_OK.
 * Returns RKS_OK, RKS_BLANK, RKS_NO_ANSWER (rks_inquiry_message says why), RKS_WRONG_KIND, RKS_UNKNOWN_ANSWER,
 * RKS_NOT_RUN, RKS_BAD_CALL, or the status of a failed run. Since ABI 1.
 */
RKS_API rks_status rks_inquiry_number(const rks_inquiry* inquiry, const char* answer, double* out);

/*
 * Reads an answer as text: a text answer as it is, a number answer in shortest decimal form, unrounded.
 *   answer  as above; "" or NULL means the default answer of the study (`sentence`).
 *   out     receives UTF-8 text ending in a zero byte; length, which may be NULL, its bytes without that.
 * After a failed run the status of that run is returned and the text is `Not computed: ` and the reason (`check`:
 * the reason alone), so that it can be shown as it is. For RKS_BLANK the text is empty; for RKS_NO_ANSWER it is
 * `Not computed: ` and the reason.
 * Returns as rks_inquiry_number. Since ABI 1.
 */
RKS_API rks_status rks_inquiry_text(const rks_inquiry* inquiry, const char* answer, const char** out, size_t* length);

/*
 * Reads a table answer (`report`), or any other answer as a table of one cell.
 *   cells   receives rows * columns cells, row by row; numbers that cannot be given have kind RKS_CELL_STATUS.
 * Returns as rks_inquiry_text. Since ABI 1.
 */
RKS_API rks_status rks_inquiry_table(const rks_inquiry* inquiry, const char* answer, const rks_cell** cells,
                                     size_t* rows, size_t* columns);

/* Why the last call on this inquiry failed: what, where, and what to do. "" if it did not. Since ABI 1. */
RKS_API const char* rks_inquiry_message(const rks_inquiry* inquiry);

/*
 * Which cell the last run failed on, for programs that show cells under other names.
 *   argument     receives the argument word
 *   row, column  receive the position inside that argument, from 1
 *   reason       receives the message without the position
 * Each may be NULL. Returns RKS_OK, or RKS_NO_ANSWER if the run did not fail on a cell. Since ABI 1.
 */
RKS_API rks_status rks_inquiry_where(const rks_inquiry* inquiry, const char** argument, size_t* row, size_t* column,
                                     const char** reason);

/* One sentence for a status number, for any number. Never NULL. Since ABI 1. */
RKS_API const char* rks_status_text(rks_status status);

/* ABI version: major * 1000 + minor. The major number is the SOVERSION. Since ABI 1. */
RKS_API uint32_t rks_abi_version(void);

/* Name, version and build of the library, one line. Since ABI 1. */
RKS_API const char* rks_build(void);

/* ------------------------------------------------------------------------------------------------ laws */

/*
 * The null laws by themselves, without ties and zeros, for a published statistic without its data.
 *   side    0 two-sided (twice the smaller tail, at most 1), 1 higher, -1 lower; tails include the statistic.
 *   p       receives the exact probability, up to rounding; NaN on failure.
 * Returns RKS_OK, RKS_BAD_CALL (null pointer, unknown side, a statistic outside its range or not a whole number),
 * RKS_NO_DATA (a sample size of 0), RKS_TOO_LARGE (more than 1,000,000,000 values in a sample, or, in far corners, an
 * exact law that would take longer than half a second).
 */

/* T+, the rank sum of the positive differences, of n non-zero differences: 0 to n(n+1)/2. Since ABI 1. */
RKS_API rks_status rks_signed_rank_tail(size_t n, double statistic, int32_t side, double* p);

/* U of the first sample, the number of pairs in which it is higher: 0 to first * second. Since ABI 1. */
RKS_API rks_status rks_rank_sum_tail(size_t first, size_t second, double u, int32_t side, double* p);

/*
 * The value at which these laws reach a level.
 *   alpha     above 0, below 1; taken as the decimal it prints to, so that 0.1 is one tenth.
 *   critical  side -1: the largest statistic whose lower tail is at most alpha. side 1: the smallest statistic whose
 *             upper tail is at most alpha. side 0: the largest whose two-sided p, on the lower side, is at most
 *             alpha. NaN, with RKS_OK, where none exists.
 * Returns as the tails. Since ABI 1.
 */
RKS_API rks_status rks_signed_rank_critical(size_t n, double alpha, int32_t side, double* critical);
RKS_API rks_status rks_rank_sum_critical(size_t first, size_t second, double alpha, int32_t side, double* critical);

/* ------------------------------------------------------------------------------------------------ catalogue */

/*
 * The catalogue: every study, argument, answer and setting there is, so that a client needs no list of its own.
 * Indices run from 0; texts are English; an index out of range gives NULL or 0. Since ABI 1.
 */

enum {
    RKS_FORM_STUDY = 1, /* takes its arguments, then an answer word, then settings */
    RKS_FORM_HELPER = 2 /* takes its arguments only and gives its default answer */
};

RKS_API size_t rks_study_count(void);
RKS_API const char* rks_study_word(size_t study);           /* "groups" */
RKS_API const char* rks_study_function(size_t study);       /* "RKS.GROUPS", the cell function */
RKS_API const char* rks_study_help(size_t study);           /* one sentence */
RKS_API int32_t rks_study_form(size_t study);               /* RKS_FORM_... */
RKS_API const char* rks_study_default_answer(size_t study); /* "sentence" */

RKS_API size_t rks_argument_count(size_t study);
RKS_API const char* rks_argument_word(size_t study, size_t argument); /* "first" */
RKS_API const char* rks_argument_help(size_t study, size_t argument);

enum { RKS_ANSWER_NUMBER = 1, RKS_ANSWER_TEXT = 2, RKS_ANSWER_TABLE = 3 };

RKS_API size_t rks_answer_count(void);              /* in the order of a report */
RKS_API const char* rks_answer_word(size_t answer); /* "p" */
RKS_API const char* rks_answer_help(size_t answer);
RKS_API int32_t rks_answer_kind(size_t answer);               /* RKS_ANSWER_... */
RKS_API int32_t rks_answer_fits(size_t answer, size_t study); /* 1 if that study gives it */
RKS_API int32_t rks_answer_find(const char* answer);          /* index of an answer word, with aliases; -1 if none */

RKS_API size_t rks_setting_count(void);
RKS_API const char* rks_setting_word(size_t setting); /* "side" */
RKS_API const char* rks_setting_help(size_t setting);
RKS_API const char* rks_setting_values(size_t setting); /* "two-sided, higher, lower", or words for what it takes */
RKS_API const char* rks_setting_default(size_t setting);
RKS_API int32_t rks_setting_fits(size_t setting, size_t study);

/* The caution to show beside results: a quiet line, or the whole text. Since ABI 1. */
RKS_API const char* rks_caution_line(void);
RKS_API const char* rks_caution(void);

#ifdef __cplusplus
}
#endif

#endif /* RANKSTEAD_H */
