# Completion of isohydric for bash: commands, options, their values, names of analytes.

_isohydric() {
    local word=${COMP_WORDS[COMP_CWORD]} before=${COMP_WORDS[COMP_CWORD - 1]} words=
    local command=${COMP_WORDS[1]} action=${COMP_WORDS[2]}
    local analytes="pH= pCO2= pO2= HCO3= TCO2= BE= SBE= Na= K= Cl= iCa= Ca= Mg= albumin= phosphate= protein= lactate= BHB=
        glucose= urea= BUN= creatinine= osmolality= ethanol= Hb= sO2= COHb= MetHb= AG= AGK= temperature= FiO2= pressure=
        urineNa= urineK= urineCl= urineUrea= urineGlucose= urineOsmolality= urinepH="
    local kinds="quantity condition interval finding table explanation group check critical-value disorder convention"
    COMPREPLY=()
    case $before in
    --specimen) words="arterial venous central-venous mixed-venous capillary cord-arterial cord-venous" ;;
    --population) words="adult child neonate pregnancy-1 pregnancy-2 pregnancy-3" ;;
    --onset) words="acute chronic unknown" ;;
    --format) words="text json" ;;
    --kind) words=$kinds ;;
    --units)
        mapfile -t COMPREPLY < <(compgen -W "si conventional" -f -- "$word")
        return
        ;;
    --rules | --site)
        mapfile -t COMPREPLY < <(compgen -f -- "$word")
        return
        ;;
    --age | --altitude | --baseline-pCO2 | --baseline-HCO3) return ;;
    esac
    if [[ -n $words ]]; then
        mapfile -t COMPREPLY < <(compgen -W "$words" -- "$word")
        return
    fi
    if ((COMP_CWORD == 1)); then
        words="check rules --help --version"
    elif [[ $command == check ]]; then
        words="--specimen --population --age --altitude --onset --baseline-pCO2 --baseline-HCO3 --rules --units --site
            --format --full --help $analytes"
    elif [[ $command == rules ]] && ((COMP_CWORD == 2)); then
        words="list show lint --help"
    elif [[ $command == rules && $action == list ]]; then
        words="--rules --kind --help"
    elif [[ $command == rules ]]; then
        words="--rules --help"
    fi
    mapfile -t COMPREPLY < <(compgen -W "$words" -- "$word")
    if [[ $command == check || $action == lint ]] && [[ $word != -* ]]; then
        local files
        mapfile -t files < <(compgen -f -- "$word")
        COMPREPLY+=("${files[@]}")
    fi
    # A name is followed by its value, not by a space.
    [[ ${COMPREPLY[0]-} == *= ]] && compopt -o nospace 2>/dev/null
    return 0
}

complete -o filenames -F _isohydric isohydric
