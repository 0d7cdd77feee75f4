# What both tests of the installed package do: run a step, check the numbers that the example prints.

function(step)
    execute_process(COMMAND ${ARGV} RESULT_VARIABLE result OUTPUT_VARIABLE output ERROR_VARIABLE output)
    if(NOT result EQUAL 0)
        list(JOIN ARGV " " command)
        message(FATAL_ERROR "${command}\nended with ${result}:\n${output}")
    endif()
endfunction()

# T+ = 6 of ten untied pairs: p = 28/1024 by counting (SciPy 1.10.1 `wilcoxon`, exact: 0.02734375); estimate and limits
# are the median and the 9th smallest and largest of the 55 Walsh averages, by NumPy.
function(check_example program)
    execute_process(COMMAND ${program} RESULT_VARIABLE result OUTPUT_VARIABLE output ERROR_VARIABLE error)
    if(NOT result EQUAL 0)
        message(FATAL_ERROR "The example ended with ${result}: ${error}")
    endif()
    foreach(line IN ITEMS "p = 0.02734375\n" "estimate = -5.25\n" "lower = -9.25\n" "upper = -1\n")
        string(FIND "${output}" "${line}" at)
        if(at EQUAL -1)
            message(FATAL_ERROR "The example does not print \"${line}\" but:\n${output}")
        endif()
    endforeach()
    if(NOT output MATCHES "\n[^\n]*minutes[^\n]*0[.]03[^\n]*\n$")
        message(FATAL_ERROR "The example does not end with a sentence that names the unit and p:\n${output}")
    endif()
    message(STATUS "${output}")
endfunction()
