# Fails if an object of OBJECTS needs a function from outside that is not of C++ itself: libm's are plain
# C names, so every undefined plain name is refused but those that compilers put in everywhere.
# Also compiles SOURCES of num without optimisation, where a hidden call would show first, and proves on
# a control file that calls libm that the check can fail.

set(allowed "^(_Z|_GLOBAL_|_Unwind_|__cxa_|__gxx_|__stack_chk|__asan|__ubsan|__tsan|__sanitizer|__dso_handle$|__libc_single_threaded$|mem(cpy|move|set|cmp|chr)$|str(len|cmp)$)")

function(foreign_symbols object result)
    execute_process(COMMAND ${NM} --undefined-only --format=posix ${object}
                    OUTPUT_VARIABLE listing COMMAND_ERROR_IS_FATAL ANY)
    string(REGEX MATCHALL "[^\n]+" lines "${listing}")
    set(found)
    foreach(line IN LISTS lines)
        string(REGEX REPLACE " .*" "" name "${line}")
        if(NOT name MATCHES "${allowed}")
            list(APPEND found ${name})
        endif()
    endforeach()
    set(${result} "${found}" PARENT_SCOPE)
endfunction()

function(compile_plain source object)
    execute_process(COMMAND ${CXX} -std=c++20 -O0 -fno-math-errno -I${SOURCE_DIR}/lib -c ${source} -o ${object}
                    COMMAND_ERROR_IS_FATAL ANY)
endfunction()

file(MAKE_DIRECTORY ${SCRATCH})
file(WRITE ${SCRATCH}/control.cpp "#include <cmath>\ndouble f(double x) { return std::log(x); }\n")
compile_plain(${SCRATCH}/control.cpp ${SCRATCH}/control.o)
foreign_symbols(${SCRATCH}/control.o control)
if(NOT control STREQUAL "log")
    message(FATAL_ERROR "the check did not see a call of libm's log, but: '${control}'")
endif()

string(REPLACE "," ";" objects "${OBJECTS}")
string(REPLACE "," ";" sources "${SOURCES}")
if(NOT objects)
    message(FATAL_ERROR "no objects to look at")
endif()
foreach(source IN LISTS sources)
    compile_plain(${SOURCE_DIR}/lib/isohydric/num/${source} ${SCRATCH}/${source}.o)
    list(APPEND objects ${SCRATCH}/${source}.o)
endforeach()
foreach(object IN LISTS objects)
    foreign_symbols(${object} found)
    if(found)
        message(SEND_ERROR "${object} needs ${found}")
    endif()
endforeach()
